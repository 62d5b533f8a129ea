import { useEffect, useRef, useState } from 'react';
import type { FitReading, LayeredEarthModel } from '../../../server/contract/fit-settings';
import { predictCurve } from '../../workers/engine';

type Spreads = readonly FitReading['spread'][];

export interface LiveCurve {
  /** Ω·m, one a spread; of the newest model that has been computed */
  predicted: readonly number[] | null;
  fault: string | null;
}

const NONE: LiveCurve = { predicted: null, fault: null };

/** The curve of a model under the hand, computed beside the page; while one is under way only the newest waits. */
export function useLiveCurve(spreads: Spreads, earth: LayeredEarthModel | null): LiveCurve {
  const [curve, setCurve] = useState<LiveCurve>(NONE);
  const wanted = useRef<{ spreads: Spreads; earth: LayeredEarthModel } | null>(null);
  const isComputing = useRef(false);
  useEffect(() => {
    wanted.current = earth && spreads.length > 0 ? { spreads, earth } : null;
    if (isComputing.current) return;
    const computeNewest = async () => {
      isComputing.current = true;
      while (wanted.current) {
        const job = wanted.current;
        const next = await computed(job.spreads, job.earth);
        if (wanted.current === null) break;
        setCurve(next);
        if (wanted.current === job) break;
      }
      isComputing.current = false;
    };
    void computeNewest();
  }, [spreads, earth]);
  return earth === null ? NONE : curve;
}

async function computed(spreads: Spreads, earth: LayeredEarthModel): Promise<LiveCurve> {
  try {
    return { predicted: [...(await predictCurve(spreads, earth))], fault: null };
  } catch (error) {
    return { predicted: null, fault: error instanceof Error ? error.message : String(error) };
  }
}
