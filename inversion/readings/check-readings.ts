import { checkBranches } from './check-branches';
import { checkSheetValues, checkSigns } from './check-sheet-values';
import { checkSlope } from './check-slope';
import { checkRepeats, checkWideMn } from './check-spread-habits';
import { checkTrend } from './check-trend';
import { curveBranches } from './curve-branches';
import type { CheckedReading, ReadingCheck } from './reading-check';

/**
 * Every doubt about the kept readings of one sounding, each with its rule and where the rule comes from.
 * Readings that were left out are judged already and are not looked at. Nothing is altered.
 */
export function checkReadings(readings: readonly CheckedReading[]): ReadingCheck[] {
  const kept = readings.filter(({ reading }) => reading.excluded === null);
  const branches = curveBranches(kept);
  return [
    ...checkSheetValues(kept),
    ...checkSigns(kept),
    ...checkSlope(branches),
    ...checkBranches(branches),
    ...checkTrend(branches),
    ...checkRepeats(kept),
    ...checkWideMn(kept),
  ];
}
