import { nameOf, say, type CheckedReading, type ReadingCheck } from './reading-check';
import { READING_TOLERANCES } from './reading-tolerances';

const differs = (written: number, computed: number): boolean =>
  Math.abs(written / computed - 1) > READING_TOLERANCES.sheetMismatch;

/** The ρa and R that were written beside V and I, against what follows from these. */
export function checkSheetValues(readings: readonly CheckedReading[]): ReadingCheck[] {
  return readings.flatMap((checked) => {
    const { reading, derived, row } = checked;
    const found: ReadingCheck[] = [];
    const tell = (message: string): void => {
      found.push({
        rows: [row],
        kind: 'sheet-mismatch',
        message,
        rule: `a written value within ${100 * READING_TOLERANCES.sheetMismatch} % of the computed one`,
        source: 'ρa = K·V/I, with K exact for the electrodes as they stand',
      });
    };
    const written = reading.sheetApparentResistivityOhmM;
    const computed = derived.apparentResistivityOhmM;
    if (written !== null && derived.resistanceOhm !== null && derived.geometricFactorM !== null)
      if (differs(written, computed))
        tell(
          `${nameOf(checked)}: the sheet says ρa ${say(written, 4)} Ω·m, but K·V/I is ${say(computed, 4)} Ω·m ` +
            `(K ${say(derived.geometricFactorM, 4)} m). The computed value is used.`,
        );
    const ratio = derived.resistanceOhm;
    const writtenR = reading.resistanceOhm;
    if (writtenR !== null && ratio !== null && ratio !== 0 && differs(writtenR, ratio))
      tell(
        `${nameOf(checked)}: the sheet says R ${say(writtenR, 4)} Ω, but V/I is ${say(ratio, 4)} Ω. V/I is used.`,
      );
    return found;
  });
}

/** A dipole–dipole sheet on which some R are below 0 and some above: one of them has M and N exchanged, or is no earth response. */
export function checkSigns(readings: readonly CheckedReading[]): ReadingCheck[] {
  const below = readings.filter(({ derived }) => (derived.geometricFactorM ?? 0) < 0);
  const above = readings.filter(
    ({ reading, derived }) => reading.spread.type === 'dipole-dipole' && (derived.resistanceOhm ?? 0) > 0,
  );
  if (!below.some(({ reading }) => reading.spread.type === 'dipole-dipole') || above.length === 0) return [];
  const few = below.length < above.length ? below : above;
  return [
    {
      rows: few.map(({ row }) => row),
      kind: 'mixed-signs',
      message:
        `V has the other sign at ${few.map(nameOf).join('; ')} than in the rest of the sheet. ` +
        'Either M and N were exchanged there, or the voltage is not the ground’s answer.',
      rule: 'one order of the electrodes, and so one sign of V/I, through a dipole–dipole sheet',
      source: 'sign of K = 2π/(1/AM − 1/BM − 1/AN + 1/BN)',
    },
  ];
}
