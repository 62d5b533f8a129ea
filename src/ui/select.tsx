import { ChevronDown } from 'lucide-react';
import type { ComponentPropsWithRef } from 'react';
import { classNames } from './class-names';
import { CONTROL_CLASS } from './control-class';
import { useFieldControl } from './field-context';

export interface SelectOption<Value extends string = string> {
  value: Value;
  label: string;
  disabled?: boolean;
}

export interface SelectProps extends ComponentPropsWithRef<'select'> {
  options: readonly SelectOption[];
  /** Offered first with the empty value, as "Choose a role". */
  placeholder?: string;
}

/** The browser's own list: it is the one that works with a telephone's wheel, type-ahead and every form library. */
export function Select({ options, placeholder, className, ...rest }: SelectProps) {
  const wiring = useFieldControl(rest);
  return (
    <span className={classNames('relative inline-flex w-full min-w-0', className)}>
      <select {...rest} {...wiring} className={classNames(CONTROL_CLASS, 'appearance-none truncate pr-8')}>
        {placeholder === undefined ? null : <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
      <ChevronDown
        aria-hidden
        size={16}
        className="pointer-events-none absolute top-1/2 right-2.5 -translate-y-1/2 text-muted"
      />
    </span>
  );
}
