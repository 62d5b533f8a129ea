import { misfitWords } from './misfit-words';
import { isRejected, REJECTED_RANGES_NOTE, REJECTED_WORDS } from './rejected-fit';

interface FitProps {
  fit: { misfitProbability: number | null } | null | undefined;
}

/** Said beside every fit that the readings reject; nothing beside the others. */
export function RejectedMark({ fit }: FitProps) {
  return isRejected(fit) ? <span className="text-sm text-rust">{REJECTED_WORDS}</span> : null;
}

/** What the misfit says of the model, as a line of its own under the figures of the fit. */
export function MisfitLine({ fit }: FitProps) {
  const words = misfitWords(fit ?? null);
  if (words === null) return null;
  const rejects = isRejected(fit);
  return (
    <p className="border-b border-rule py-1.5 text-sm">
      <span className={rejects ? 'font-semibold text-rust' : undefined}>This model {words}.</span>
      {rejects ? ` ${REJECTED_RANGES_NOTE}` : null}
    </p>
  );
}
