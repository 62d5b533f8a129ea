import type { Borehole } from '../../server/contract/surveys';

export interface NearBorehole {
  borehole: Borehole;
  distanceM: number;
}

/** Within this a log is drawn beside the ground of a sounding; the ground changes over longer ways. */
export const BESIDE_M = 100;

/** The holes nearest to a place, nearest first; none where a position is not known. */
export function nearestBoreholes(
  place: { xM: number | null; yM: number | null },
  boreholes: readonly Borehole[],
  count: number,
): NearBorehole[] {
  const { xM, yM } = place;
  if (xM === null || yM === null) return [];
  return boreholes
    .flatMap((borehole) =>
      borehole.xM === null || borehole.yM === null
        ? []
        : [{ borehole, distanceM: Math.hypot(borehole.xM - xM, borehole.yM - yM) }],
    )
    .toSorted((a, b) => a.distanceM - b.distanceM)
    .slice(0, count);
}
