import { rampColor } from '../charts/resistivity-ramp';
import type { LayeredEarthModel } from '../../server/contract/fit-settings';

const WIDTH = 18;
const HEIGHT = 44;
/** A thin bed is still seen. */
const LEAST_BAND = 1.5;

/** Depths on a square-root scale, so that thin upper beds keep a visible share. */
function bands(earth: LayeredEarthModel): { top: number; base: number; resistivity: number }[] {
  let depth = 0;
  const bases = earth.thickness.map((thickness) => Math.sqrt((depth += thickness)));
  const reach = (bases.at(-1) ?? 0.8) * 1.25;
  return earth.resistivity.map((resistivity, i) => ({
    top: ((bases[i - 1] ?? 0) / reach) * HEIGHT,
    base: ((bases[i] ?? reach) / reach) * HEIGHT,
    resistivity,
  }));
}

/** The ground of a run in the size of a thumbnail; beside it stands what it shows in words. */
export function MiniColumn({ earth }: { earth: LayeredEarthModel | null }) {
  return (
    <svg aria-hidden viewBox={`0 0 ${WIDTH} ${HEIGHT}`} width={WIDTH} height={HEIGHT} className="shrink-0">
      {earth ? (
        bands(earth).map(({ top, base, resistivity }) => (
          <rect
            key={top}
            y={top}
            width={WIDTH}
            height={Math.max(LEAST_BAND, base - top)}
            fill={rampColor(resistivity)}
          />
        ))
      ) : (
        <rect
          x="0.5"
          y="0.5"
          width={WIDTH - 1}
          height={HEIGHT - 1}
          fill="none"
          stroke="var(--edge)"
          strokeDasharray="2 3"
        />
      )}
    </svg>
  );
}
