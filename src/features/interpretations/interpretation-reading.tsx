import { useMemo } from 'react';
import type { Interpretation } from '../../../server/contract/interpretations';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { InterpretationGround } from './interpretation-ground';
import { InterpretationText } from './interpretation-text';

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
      <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(16rem,20rem)_minmax(0,1fr)] 2xl:grid-cols-[minmax(26rem,30rem)_minmax(0,1fr)]">
        <InterpretationGround
          run={run}
          sounding={sounding}
          grounds={grounds}
          waterLevelDepthM={waterLevelDepthM}
        />
        <div className="flex min-w-0 flex-col gap-6">
          <InterpretationText content={interpretation} run={run} />
        </div>
      </div>
    </article>
  );
}
