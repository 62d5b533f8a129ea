import type { FitResult } from '../../../server/contract/fit-result';
import type { Run } from '../../../server/contract/runs';
import { waterLevelWords } from '../../ui/water-level-words';
import { BedBasis } from './bed-basis';
import type { InterpretationForm } from './interpretation-form';
import { BED_ROLE_WORDS, CONFIDENCE_WORDS } from './interpretation-words';

export interface InterpretationTextProps {
  content: Omit<InterpretationForm, 'title'>;
  run: Run;
}

/** What an interpretation says, in words: on screen for a reader, on paper for everyone. */
export function InterpretationText({ content, run }: InterpretationTextProps) {
  const { beds, waterLevelDepthM, narrative } = content;
  const hasWater = waterLevelDepthM !== null && Number.isFinite(waterLevelDepthM);
  return (
    <>
      {run.result ? <BedList beds={beds} result={run.result} /> : null}
      <section>
        <h2 className="font-semibold">Water level</h2>
        <p className={hasWater ? 'figure' : 'text-muted'}>
          {hasWater ? waterLevelWords(waterLevelDepthM) : 'Not given'}
        </p>
      </section>
      <section>
        <h2 className="font-semibold">Narrative</h2>
        <p className={`max-w-prose whitespace-pre-wrap ${narrative === '' ? 'text-muted' : ''}`}>
          {narrative === '' ? 'None written' : narrative}
        </p>
      </section>
    </>
  );
}

function BedList({ beds, result }: { beds: InterpretationForm['beds']; result: FitResult }) {
  return (
    <section aria-label="Beds">
      <ol className="border-t border-rule">
        {beds.map((bed) => (
          <li
            key={bed.layerIndex}
            className="grid gap-x-6 gap-y-2 border-b border-rule py-3 sm:grid-cols-[10rem_minmax(0,1fr)] print:break-inside-avoid"
          >
            <BedBasis result={result} layerIndex={bed.layerIndex} />
            <div>
              <p className={bed.ground === '' ? 'text-muted' : 'font-semibold'}>
                {bed.ground === '' ? 'Not named' : bed.ground}
              </p>
              {bed.role === 'unknown' && bed.confidence === 'unstated' ? null : (
                <p>
                  {BED_ROLE_WORDS[bed.role]}
                  <span className="text-muted">
                    , confidence: {CONFIDENCE_WORDS[bed.confidence].toLowerCase()}
                  </span>
                </p>
              )}
              {bed.otherCandidates === '' ? null : (
                <p className="text-muted">It could also be: {bed.otherCandidates}</p>
              )}
            </div>
          </li>
        ))}
      </ol>
    </section>
  );
}
