import { useState } from 'react';
import { formatSignificant } from '../../ui/format';
import { limitFault, parseNumber } from '../../ui/parse-number';

export interface ValueCellProps {
  label: string;
  value: number;
  /** A number above 0 that is not the one shown. */
  onCommit: (value: number) => void;
}

const shown = (value: number): string => formatSignificant(value, 4).replaceAll('\u202f', '');

/** A number in its table that can be written over; taken by Enter or on leaving, given up by Escape. */
export function ValueCell({ label, value, onCommit }: ValueCellProps) {
  const [text, setText] = useState<string | null>(null);
  const fault = text === null ? null : faultOf(text);
  const commit = () => {
    const next = text === null ? null : parseNumber(text).value;
    // The number shown is rounded; leaving it as it stands must not round the model.
    if (next !== null && fault === null && text !== shown(value)) onCommit(next);
    if (fault === null) setText(null);
  };
  return (
    <input
      aria-label={label}
      aria-invalid={fault !== null || undefined}
      title={fault ?? undefined}
      inputMode="decimal"
      autoComplete="off"
      value={text ?? shown(value)}
      onChange={(event) => setText(event.target.value)}
      onFocus={(event) => event.target.select()}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commit();
        if (event.key === 'Escape') setText(null);
      }}
      className="figure min-h-7 w-20 rounded border border-transparent bg-transparent px-1.5 hover:border-edge focus-visible:border-edge focus-visible:bg-sheet aria-invalid:border-rust aria-invalid:bg-rust-tint touch:min-h-11"
    />
  );
}

function faultOf(text: string): string | null {
  const parsed = parseNumber(text);
  if (parsed.value === null) return parsed.fault ?? 'Write a number above 0';
  return limitFault(parsed.value, { above: 0 });
}
