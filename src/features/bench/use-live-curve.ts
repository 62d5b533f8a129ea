import { useEffect, useRef, useState } from 'react';
import type { LayeredEarthModel } from '../../../server/contract/fit';
import type { KeptReading } from '../../runs/curve-of-run';
import { predictCurve } from '../../workers/engine';

export interface LiveCurve {
  /** Ω·m, one a kept reading; of the newest model that has been computed */
  predicted: readonly number[] | null;
  fault: string | null;
}

const NONE: LiveCurve = { predicted: null, fault: null };

/** The curve of a model under the hand, computed beside the page; while one is under way only the newest waits. */
export function useLiveCurve(kept: readonly KeptReading[], earth: LayeredEarthModel | null): LiveCurve {
  const [curve, setCurve] = useState<LiveCurve>(NONE);
  const wanted = useRef<{ kept: readonly KeptReading[]; earth: LayeredEarthModel } | null>(null);
  const isComputing = useRef(false);
  useEffect(() => {
    wanted.current = earth && kept.length > 0 ? { kept, earth } : null;
    if (isComputing.current) return;
    const computeNewest = async () => {
      isComputing.current = true;
      while (wanted.current) {
        const job = wanted.current;
        const next = await computed(job.kept, job.earth);
        if (wanted.current === null) break;
        setCurve(next);
        if (wanted.current === job) break;
      }
      isComputing.current = false;
    };
    void computeNewest();
  }, [kept, earth]);
  return earth === null ? NONE : curve;
}

async function computed(kept: readonly KeptReading[], earth: LayeredEarthModel): Promise<LiveCurve> {
  try {
    const predicted = await predictCurve(
      kept.map((reading) => reading.spread),
      earth,
    );
    return { predicted: [...predicted], fault: null };
  } catch (error) {
    return { predicted: null, fault: error instanceof Error ? error.message : String(error) };
  }
}
