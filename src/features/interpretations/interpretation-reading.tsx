import { useMemo } from 'react';
import type { Interpretation } from '../../../server/contract/interpretations';
import type { FitResult } from '../../../server/contract/fit';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { formatLength, withUnit } from '../../ui/format';
import { BedBasis } from './bed-basis';
import { InterpretationGround } from './interpretation-ground';
import { BED_ROLE_WORDS, CONFIDENCE_WORDS } from './interpretation-words';

export interface InterpretationReadingProps {
  sounding: Sounding;
  interpretation: Interpretation;
  run: Run;
}

/** The interpretation for one who reads it: words, not inputs. */
export function InterpretationReading({ sounding, interpretation, run }: InterpretationReadingProps) {
  const { beds, waterLevelDepthM } = interpretation;
  const grounds = useMemo(() => beds.map((bed) => bed.ground), [beds]);
  return (
    <article className="flex flex-col gap-6">
      <h1 className="text-xl font-semibold">{interpretation.title}</h1>
      <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(16rem,20rem)_minmax(0,1fr)]">
        <InterpretationGround
          run={run}
          soundingName={sounding.name}
          grounds={grounds}
          waterLevelDepthM={waterLevelDepthM}
        />
        <div className="flex min-w-0 flex-col gap-6">
          {run.result ? <BedList beds={beds} result={run.result} /> : null}
          <section>
            <h2 className="font-semibold">Water level</h2>
            <p className={waterLevelDepthM === null ? 'text-muted' : 'figure'}>
              {waterLevelDepthM === null
                ? 'Not given'
                : withUnit(formatLength(waterLevelDepthM), 'm below ground')}
            </p>
          </section>
          <section>
            <h2 className="font-semibold">Narrative</h2>
            <p
              className={`max-w-prose whitespace-pre-wrap ${interpretation.narrative === '' ? 'text-muted' : ''}`}
            >
              {interpretation.narrative === '' ? 'None written' : interpretation.narrative}
            </p>
          </section>
        </div>
      </div>
    </article>
  );
}

function BedList({ beds, result }: { beds: Interpretation['beds']; result: FitResult }) {
  return (
    <section aria-label="Beds">
      <ol className="border-t border-rule">
        {beds.map((bed) => (
          <li
            key={bed.layerIndex}
            className="grid gap-x-6 gap-y-2 border-b border-rule py-3 sm:grid-cols-[10rem_minmax(0,1fr)]"
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
