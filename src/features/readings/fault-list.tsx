import { formatCount } from '../../ui/format';
import type { SheetFault } from './sheet-reader';

const MOST_SHOWN = 50;

interface FaultListProps {
  faults: readonly SheetFault[];
  onJump: (fault: SheetFault) => void;
}

/** Everything that stops a row from being a reading; each leads to its cell. */
export function FaultList({ faults, onJump }: FaultListProps) {
  if (faults.length === 0) return null;
  return (
    <section aria-label="Faults" className="border-l-2 border-l-rust bg-rust-tint py-2 pr-3 pl-3">
      <h2 className="font-semibold">{formatCount(faults.length, 'fault')} to mend before saving</h2>
      <ul className="mt-1 max-h-72 overflow-y-auto">
        {faults.slice(0, MOST_SHOWN).map((fault) => (
          <li key={`${fault.row} ${fault.column}`}>
            <button
              type="button"
              onClick={() => onJump(fault)}
              className="min-h-6 py-0.5 text-left underline decoration-rule underline-offset-2 hover:decoration-ink touch:min-h-11"
            >
              <span className="figure">Row {fault.row}</span>
              {fault.columnName === '' ? '' : `, ${fault.columnName}`}:{' '}
              {fault.found === '' ? '' : `“${fault.found}” `}
              {fault.message}. Allowed: {fault.allowed}.
            </button>
          </li>
        ))}
      </ul>
      {faults.length > MOST_SHOWN ? (
        <p className="text-sm text-muted">The first {MOST_SHOWN} are listed.</p>
      ) : null}
    </section>
  );
}
