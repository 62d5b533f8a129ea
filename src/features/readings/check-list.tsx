import type { ReadingCheck } from '../../../server/contract/readings';
import { formatCount } from '../../ui/format';

interface CheckListProps {
  /** How many readings were looked at. */
  readings: number;
  checks: readonly Pick<ReadingCheck, 'rows' | 'message' | 'rule' | 'source'>[];
  onJump?: (row: number) => void;
}

/** Doubts that alter nothing: each with the rule it follows and where the rule comes from. */
export function CheckList({ readings, checks, onJump }: CheckListProps) {
  return (
    <section aria-label="Checks">
      <h2 className="mb-2 font-semibold">Checks</h2>
      {checks.length === 0 ? (
        <p className="text-muted">
          {readings === 0 ? 'No reading to check yet.' : 'No check has anything to say about these readings.'}
        </p>
      ) : (
        <>
          <p className="text-sm text-muted">
            {formatCount(checks.length, 'doubt')}; nothing is altered or left out by them.
          </p>
          <ul className="mt-2 flex flex-col gap-3 border-l-2 border-l-copper pl-3">
            {checks.map((check) => (
              <li key={`${check.rows.join(' ')} ${check.message}`}>
                <p>
                  {check.message}{' '}
                  {onJump
                    ? check.rows.map((row) => (
                        <button
                          key={row}
                          type="button"
                          onClick={() => onJump(row - 1)}
                          className="figure mr-1.5 min-h-6 text-sm underline underline-offset-2 touch:min-h-11"
                        >
                          row {row}
                        </button>
                      ))
                    : null}
                </p>
                <p className="text-sm text-muted">
                  Rule: {sentence(check.rule)} Source: {sentence(check.source)}
                </p>
              </li>
            ))}
          </ul>
        </>
      )}
    </section>
  );
}

const sentence = (text: string): string => (/[.?]$/.test(text) ? text : `${text}.`);
