import type { Reading } from '../../../server/contract/readings';
import { formatCount, formatRelativeError } from '../../ui/format';

/** Which errors a fit of this sheet counts with: the readings' own, the survey's floor, or both. */
export function errorWords(readings: readonly Pick<Reading, 'standardError'>[], floor: number): string {
  const least = `the survey’s floor of ${formatRelativeError(floor)}`;
  const own = readings.filter(({ standardError }) => standardError !== null && standardError > 0).length;
  if (own === 0) return `Total error: ${least}, as no reading states an error of its own.`;
  const both = `own error and ${least}, added in quadrature`;
  if (own === readings.length) return `Total error: each reading’s ${both}.`;
  const without = readings.length - own;
  return `Total error: ${both}, for ${formatCount(own, 'reading')}; the floor alone for the ${without} that ${without === 1 ? 'states' : 'state'} no error.`;
}
