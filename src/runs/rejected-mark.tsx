import { isRejected, REJECTED_WORDS } from './rejected-fit';

/** Said beside every fit that the readings reject; nothing beside the others. */
export function RejectedMark({ fit }: { fit: { misfitProbability: number | null } | null | undefined }) {
  return isRejected(fit) ? <span className="text-sm text-rust">{REJECTED_WORDS}</span> : null;
}
