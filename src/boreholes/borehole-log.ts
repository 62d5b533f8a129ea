import type { Borehole } from '../../server/contract/surveys';
import type { BoreholeLog } from '../charts/chart-data';
import { latestWaterLevel } from './latest-water-level';

/** A hole as it is drawn: the driller's words by depth, and the water level measured last. */
export const boreholeLog = (borehole: Borehole): BoreholeLog => ({
  name: borehole.name,
  beds: borehole.intervals.map(({ topM, baseM, description }) => ({
    top: topM,
    base: baseM,
    label: description,
  })),
  waterLevel: latestWaterLevel(borehole)?.depthM ?? null,
});
