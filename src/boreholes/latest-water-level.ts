import type { Borehole } from '../../server/contract/surveys';

/** The water level measured last; null where none was. */
export function latestWaterLevel(
  borehole: Pick<Borehole, 'waterLevels'>,
): Borehole['waterLevels'][number] | null {
  return borehole.waterLevels.toSorted((a, b) => b.measuredOn.localeCompare(a.measuredOn))[0] ?? null;
}
