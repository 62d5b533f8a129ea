import { useId, useMemo, type ReactNode } from 'react';
import { classNames } from './class-names';
import { FieldContext } from './field-context';

export interface FieldProps {
  label: ReactNode;
  /** Shown under the control; says what is allowed, with its unit. */
  hint?: ReactNode;
  /** A fault a person can act on. */
  error?: ReactNode;
  required?: boolean;
  /** Keeps the label for screen readers only, as in a dense row whose column head says it. */
  labelHidden?: boolean;
  className?: string;
  children: ReactNode;
}

/** Label, control, hint and fault as one; the control inside finds its id and description by itself. */
export function Field({
  label,
  hint,
  error,
  required = false,
  labelHidden,
  className,
  children,
}: FieldProps) {
  const id = useId();
  const invalid = error !== undefined && error !== null && error !== false && error !== '';
  const hasHint = hint !== undefined && hint !== null && hint !== '';
  const wiring = useMemo(
    () => ({
      controlId: `${id}-control`,
      describedBy: [invalid && `${id}-error`, hasHint && `${id}-hint`].filter(Boolean).join(' ') || undefined,
      invalid,
      required,
    }),
    [id, invalid, hasHint, required],
  );
  return (
    <FieldContext.Provider value={wiring}>
      <div className={classNames('flex min-w-0 flex-col gap-1', className)}>
        <label
          htmlFor={wiring.controlId}
          className={labelHidden ? 'sr-only' : 'text-sm font-semibold text-ink'}
        >
          {label}
          {required ? (
            <span aria-hidden className="font-normal text-muted">
              {' '}
              (required)
            </span>
          ) : null}
        </label>
        {children}
        {hasHint ? (
          <p id={`${id}-hint`} className="text-sm text-muted">
            {hint}
          </p>
        ) : null}
        {invalid ? (
          <p id={`${id}-error`} role="alert" className="text-sm text-rust first-letter:uppercase">
            {error}
          </p>
        ) : null}
      </div>
    </FieldContext.Provider>
  );
}
