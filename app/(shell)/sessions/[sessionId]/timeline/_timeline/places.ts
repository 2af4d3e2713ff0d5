export const GRID_ID = 'timeline-grid';
export const INSPECTOR_ID = 'chosen-scan';
export const SHEET_ID = 'timeline-sheet';

/** Move mode started elsewhere gives the grid the focus, so that its keys act. */
export function focusGrid(): void {
  document.getElementById(GRID_ID)?.focus({ preventScroll: true });
}

/** Where the sheet lies on the screen now; null while it is not drawn. */
export function sheetBox(): DOMRect | null {
  return document.getElementById(SHEET_ID)?.getBoundingClientRect() ?? null;
}
