import { useId, useState, type ComponentPropsWithRef } from 'react';
import { classNames } from './class-names';
import { CONTROL_CLASS } from './control-class';
import { useFieldControl } from './field-context';
import { limitFault, parseNumber, type NumberLimits } from './parse-number';

type Omitted = 'value' | 'defaultValue' | 'onChange' | 'type' | 'min' | 'max';

export interface NumberInputProps extends Omit<ComponentPropsWithRef<'input'>, Omitted>, NumberLimits {
  value: number | null;
  /** Called at every keystroke: the number, or null with its fault (null and no fault = left empty). */
  onValueChange: (value: number | null, fault: string | null) => void;
  unit?: string;
}

/** Keeps what was typed as it was typed; never rounds or rewrites it under the writer's hands. */
export function NumberInput(props: NumberInputProps) {
  const { value, onValueChange, unit, min, max, above, below, integer, className, ...rest } = props;
  const limits = { min, max, above, below, integer };
  const faultId = useId();
  const [text, setText] = useState(() => (value === null ? '' : String(value)));
  const [known, setKnown] = useState(value);
  if (!Object.is(known, value)) {
    setKnown(value);
    if (parseNumber(text).value !== value) setText(value === null ? '' : String(value));
  }
  const fault = faultOf(text, limits, unit);
  const wiring = useFieldControl({
    ...rest,
    'aria-describedby': fault === null ? rest['aria-describedby'] : faultId,
    'aria-invalid': fault === null ? rest['aria-invalid'] : true,
  });
  const change = (next: string) => {
    setText(next);
    const nextFault = faultOf(next, limits, unit);
    const nextValue = nextFault === null ? parseNumber(next).value : null;
    setKnown(nextValue);
    onValueChange(nextValue, nextFault);
  };
  return (
    <span className={classNames('flex min-w-0 flex-col gap-1', className)}>
      <span className="relative flex min-w-0">
        <input
          autoComplete="off"
          inputMode="decimal"
          {...rest}
          {...wiring}
          value={text}
          onChange={(event) => change(event.target.value)}
          className={classNames(CONTROL_CLASS, 'figure text-right')}
          style={unit === undefined ? undefined : { paddingRight: `calc(${unit.length}ch + 1.25rem)` }}
        />
        {unit === undefined ? null : (
          <span className="figure pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-sm text-muted">
            {unit}
          </span>
        )}
      </span>
      {fault === null ? null : (
        <span id={faultId} role="alert" className="text-sm text-rust">
          {fault}
        </span>
      )}
    </span>
  );
}

function faultOf(text: string, limits: NumberLimits, unit: string | undefined): string | null {
  const parsed = parseNumber(text);
  return parsed.value === null ? parsed.fault : limitFault(parsed.value, limits, unit);
}
