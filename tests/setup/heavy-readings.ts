import type { Reading } from '../../server/contract/readings';

/** Readings that take an automatic fit long enough to be interrupted. */
export const HEAVY = 250;

/** A sounding whose automatic fit takes seconds; figures made for the tests. */
export function heavyReadings(count = HEAVY): Reading[] {
  return Array.from({ length: count }, (_, i) => ({
    spread: { type: 'schlumberger', halfAB: 1.5 * 400 ** (i / (count - 1)), halfMN: 0.4 },
    voltageMv: null,
    currentMa: null,
    resistanceOhm: null,
    sheetApparentResistivityOhmM: 80 * Math.exp(Math.sin((12 * i) / count)) * (1 + 0.05 * Math.sin(i * i)),
    standardError: 0.02,
    remark: '',
    excluded: null,
  }));
}
