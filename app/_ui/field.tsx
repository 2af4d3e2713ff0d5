import { useId, type ComponentProps, type ReactNode } from 'react';

type FieldProps = Omit<ComponentProps<'input'>, 'id'> & {
  label: string;
  help?: ReactNode;
  /** what is wrong first, then how to put it right; the value stays */
  error?: string;
  /** a unit, or a small button, inside at the right */
  end?: ReactNode;
};

export function Field({ label, help, error, end, className = '', ...input }: FieldProps) {
  const id = useId();
  const described = [help !== undefined && `${id}-help`, error !== undefined && `${id}-error`]
    .filter(Boolean)
    .join(' ');
  return (
    <div>
      <label className="label" htmlFor={id}>
        {label}
      </label>
      <div className="relative">
        <input
          {...input}
          id={id}
          className={`field ${className}`}
          aria-invalid={error !== undefined || undefined}
          aria-describedby={described || undefined}
        />
        {end !== undefined && <div className="field-end">{end}</div>}
      </div>
      {help !== undefined && (
        <p id={`${id}-help`} className="help mt-1">
          {help}
        </p>
      )}
      {error !== undefined && (
        <p id={`${id}-error`} className="mt-1 text-small font-strong text-verm">
          {error}
        </p>
      )}
    </div>
  );
}
