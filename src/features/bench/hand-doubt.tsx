import type { FitSettings, LayeredEarthModel } from '../../../server/contract/fit-settings';
import { Sentence } from '../../ui/sentence';
import { boundsReached } from './bounds-reached';

export interface HandDoubtProps {
  earth: LayeredEarthModel;
  /** Settings of the run in whose ladder the model stands; null for one made by hand. */
  ladderSettings: FitSettings | null;
  mayFit: boolean;
}

/** What stands in the place of the doubts of a run, where the model is none. */
export function HandDoubt({ earth, ladderSettings, mayFit }: HandDoubtProps) {
  const kind = ladderSettings ? 'A model looked at from the ladder' : 'A model by hand';
  const way = mayFit ? ': fit from it to learn what the readings tell' : '';
  return (
    <section aria-labelledby="doubt-title">
      <h2 id="doubt-title" className="mb-2 font-semibold">
        What the data cannot tell
      </h2>
      <ul className="flex flex-col gap-2 border-l-2 border-water pl-3">
        <li>
          {kind} has no ranges{way}.
        </li>
        {(ladderSettings ? boundsReached(earth, ladderSettings) : []).map((words) => (
          <li key={words}>
            <Sentence text={words} />
          </li>
        ))}
      </ul>
    </section>
  );
}
