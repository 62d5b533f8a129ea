import type { Revision } from '../../../server/contract/readings';

/** What saving came to, in a sentence. */
export const saveOutcome = ({ isNew, revision }: { isNew: boolean; revision: Revision }): string =>
  isNew
    ? `Saved as revision ${revision.number}.`
    : `Same content as revision ${revision.number}, which is the current one again.`;
