/** Name, drawing, figures: side by side from desk width on, one under the other on a phone. */
export const ROW =
  'grid grid-cols-[minmax(0,1fr)] px-[12px] desk:grid-cols-[152px_minmax(0,1fr)_172px] desk:px-0';
/** Together, marked, Sun, Moon. */
export const FIGURES = 'grid-cols-[42px_46px_32px_34px] justify-end gap-x-[4px] pr-[10px]';
