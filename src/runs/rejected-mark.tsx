import { isRejected, REJECTED_RANGES_NOTE, REJECTED_WORDS } from './rejected-fit';

interface RejectedProps {
  fit: { misfitProbability: number | null } | null | undefined;
}

/** Said beside every fit that the readings reject; nothing beside the others. */
export function RejectedMark({ fit }: RejectedProps) {
  return isRejected(fit) ? <span className="text-sm text-rust">{REJECTED_WORDS}</span> : null;
}

/** The same as a line of its own, under the figures of the fit. */
export function RejectedLine({ fit }: RejectedProps) {
  if (!isRejected(fit)) return null;
  return (
    <p className="border-b border-rule py-1.5 text-sm">
      <span className="font-semibold text-rust">This model {REJECTED_WORDS}.</span> {REJECTED_RANGES_NOTE}
    </p>
  );
}
