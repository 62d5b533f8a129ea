import { useEffect, useId, useRef, type ComponentPropsWithoutRef, type ReactNode, type Ref } from 'react';
import { classNames } from './class-names';

export interface CheckboxProps extends Omit<ComponentPropsWithoutRef<'input'>, 'type'> {
  label: ReactNode;
  hint?: ReactNode;
  labelHidden?: boolean;
  /** Some but not all of what it stands for is chosen. */
  indeterminate?: boolean;
  ref?: Ref<HTMLInputElement>;
}

export function Checkbox({
  label,
  hint,
  labelHidden = false,
  indeterminate = false,
  className,
  ref,
  ...rest
}: CheckboxProps) {
  const id = useId();
  const box = useRef<HTMLInputElement | null>(null);
  useEffect(() => {
    if (box.current) box.current.indeterminate = indeterminate;
  }, [indeterminate]);
  const setRef = (element: HTMLInputElement | null) => {
    box.current = element;
    if (typeof ref === 'function') ref(element);
    else if (ref) ref.current = element;
  };
  return (
    <span
      className={classNames(
        'inline-flex min-h-6 items-start gap-2 touch:min-h-11 touch:items-center',
        className,
      )}
    >
      <input
        id={`${id}-box`}
        aria-describedby={hint ? `${id}-hint` : undefined}
        {...rest}
        ref={setRef}
        type="checkbox"
        className="mt-0.5 size-4 shrink-0 cursor-pointer accent-water disabled:cursor-not-allowed touch:mt-0 touch:size-5"
      />
      <span className={labelHidden ? 'sr-only' : 'min-w-0'}>
        <label htmlFor={rest.id ?? `${id}-box`} className="cursor-pointer">
          {label}
        </label>
        {hint ? (
          <span id={`${id}-hint`} className="block text-sm text-muted">
            {hint}
          </span>
        ) : null}
      </span>
    </span>
  );
}
