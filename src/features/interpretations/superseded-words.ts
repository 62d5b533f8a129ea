import type { Interpretation } from '../../../server/contract/interpretations';

/** What acceptance of another does to the interpretation of the sounding that stands now; empty where none does. */
export function supersededWords(all: readonly Pick<Interpretation, 'state' | 'title'>[]): string {
  const standing = all.find(({ state }) => state === 'accepted');
  return standing ? ` “${standing.title}”, accepted before, is superseded.` : '';
}
