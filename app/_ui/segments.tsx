'use client';

type SegmentsProps<T extends string> = {
  /** what is chosen, for those who do not see the row */
  label: string;
  value: T;
  options: readonly { value: T; label: string }[];
  onChoose: (value: T) => void;
};

/** One of few. */
export function Segments<T extends string>({ label, value, options, onChoose }: SegmentsProps<T>) {
  return (
    <div className="seg" role="group" aria-label={label}>
      {options.map((option) => (
        <button
          key={option.value}
          type="button"
          aria-pressed={option.value === value}
          onClick={() => onChoose(option.value)}
        >
          {option.label}
        </button>
      ))}
    </div>
  );
}
