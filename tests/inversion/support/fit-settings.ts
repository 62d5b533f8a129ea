import type { FitSettings } from '../../../inversion';

/** Settings of a layered fit with the default bounds. */
export function layered(layers: FitSettings['layers'], more: Partial<FitSettings> = {}): FitSettings {
  return {
    kind: 'layered',
    layers,
    seed: 1,
    bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
    fixed: [],
    priors: [],
    outlierTolerant: false,
    ...more,
  };
}
