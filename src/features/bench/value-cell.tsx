import { useId, useState } from 'react';
import { flushSync } from 'react-dom';
import { formatGiven, formatSignificant, withUnit } from '../../ui/format';
import { parseNumber } from '../../ui/parse-number';

export interface ValueCellProps {
  label: string;
  value: number;
  unit: string;
  /** Least and greatest value that is taken. */
  limits: readonly [number, number];
  /** A number within the limits that is not the one shown. */
  onCommit: (value: number) => void;
}

const plain = (text: string): string => text.replaceAll('\u202f', '');
const shown = (value: number): string => plain(formatSignificant(value));
/** As it is written over: near enough to the number itself that what was typed is found again. */
const written = (value: number): string =>
  plain(
    formatSignificant(value, 6)
      .replace(/(\.\d*?)0+$/, '$1')
      .replace(/\.$/, ''),
  );

/**
 * A number in its table that can be written over; taken by Enter or on leaving, given up by Escape. What cannot be taken
 * stays with the words of what is allowed, and the model keeps its number.
 */
export function ValueCell({ label, value, unit, limits, onCommit }: ValueCellProps) {
  const [text, setText] = useState<string | null>(null);
  const faultId = useId();
  const isUntouched = text === null || text === written(value);
  const fault = isUntouched ? null : faultOf(text, limits, unit);
  const commit = () => {
    if (fault !== null) return;
    const next = isUntouched ? null : parseNumber(text).value;
    // The number shown is rounded; leaving it as it stands must not round the model.
    if (next !== null) onCommit(next);
    setText(null);
  };
  return (
    <span className="flex flex-col">
      <input
        aria-label={label}
        aria-invalid={fault !== null || undefined}
        aria-describedby={fault === null ? undefined : faultId}
        inputMode="decimal"
        autoComplete="off"
        value={text ?? shown(value)}
        onChange={(event) => setText(event.target.value)}
        onFocus={(event) => {
          // The number in full has to stand there before it is selected.
          flushSync(() => setText((before) => before ?? written(value)));
          event.target.select();
        }}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') setText(null);
        }}
        className="figure min-h-7 w-20 rounded border border-transparent bg-transparent px-1.5 hover:border-edge focus-visible:border-edge focus-visible:bg-sheet aria-invalid:border-rust aria-invalid:bg-rust-tint touch:min-h-11"
      />
      {fault === null ? null : (
        <span
          id={faultId}
          role="alert"
          className="block max-w-32 px-1.5 py-1 text-xs leading-tight whitespace-normal text-rust"
        >
          {fault} Escape brings back {shown(value)}.
        </span>
      )}
    </span>
  );
}

/** Why a text cannot be taken, and what can; null where it can. */
export function faultOf(text: string, [least, most]: readonly [number, number], unit: string): string | null {
  const { value } = parseNumber(text);
  if (value !== null && value >= least && value <= most) return null;
  const found = text.trim() === '' ? 'Nothing is written' : `Found \u201c${text.trim()}\u201d`;
  return `${found}: write a number from ${formatGiven(least)} to ${withUnit(formatGiven(most), unit)}.`;
}
