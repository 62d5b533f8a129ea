import { formatFixed, formatRelativeError, formatResistivity, withUnit } from '../ui/format';
import type { CurveLine, CurveReading } from './chart-data';
import { branchName } from './curve-branches';

export interface Fact {
  label: string;
  value: string;
}

/** What is known of one reading, for its tip, its readout and its place in speech. */
export function readingFacts(reading: CurveReading, index: number, line: CurveLine | null): Fact[] {
  const facts: Fact[] = [
    {
      label: 'Spacing',
      value: [reading.label, ...(reading.halfMN === undefined ? [] : [branchName(reading.halfMN)])].join(
        ', ',
      ),
    },
    { label: 'Measured', value: withUnit(formatResistivity(reading.apparentResistivity), 'Ω·m') },
  ];
  if (reading.relativeError > 0)
    facts.push({ label: 'Standard error', value: formatRelativeError(reading.relativeError) });
  const predicted = line?.predicted?.[index] ?? null;
  const residual = line?.residuals?.[index] ?? null;
  const of = line && line.letter !== '' ? `, run ${line.letter}` : '';
  if (predicted !== null)
    facts.push({ label: `Predicted${of}`, value: withUnit(formatResistivity(predicted), 'Ω·m') });
  if (residual !== null) facts.push({ label: `Residual${of}`, value: formatResidual(residual) });
  if (reading.excluded) facts.push({ label: 'Left out', value: reading.reason ?? 'no reason given' });
  return facts;
}

/** "+1.24 σ": above zero the model reads higher than the ground. */
export function formatResidual(residual: number): string {
  const text = formatFixed(residual, 2);
  return withUnit(residual > 0 && Number(text) !== 0 ? `+${text}` : text, 'σ');
}

/** One sentence for a screen reader. */
export function readingSentence(facts: readonly Fact[]): string {
  return facts
    .map((fact, index) =>
      index === 0 ? fact.value : `${fact.label.charAt(0).toLowerCase()}${fact.label.slice(1)} ${fact.value}`,
    )
    .join(', ')
    .replaceAll('Ω·m', 'ohm metres')
    .replaceAll('σ', 'standard errors');
}
