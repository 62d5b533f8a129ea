import type { Fault } from '../contract/common';
import { AppError } from '../errors';

const DAY_MS = 86_400_000;

/** Somewhere on earth it may be tomorrow already: the day after today in UTC, ISO 8601. */
export const tomorrow = (now = new Date()): string =>
  new Date(now.getTime() + DAY_MS).toISOString().slice(0, 10);

/** What was drilled or measured lies behind us. Days are ISO 8601, and so compare as text. */
export function requireDaysUpTo(
  lastDay: string,
  hole: { drilledOn: string | null; waterLevels: readonly { measuredOn: string }[] },
): void {
  const faults: Fault[] = [];
  const check = (day: string | null, ...path: Fault['path']): void => {
    if (day !== null && day > lastDay)
      faults.push({
        path: ['body', ...path],
        message: 'must not lie in the future',
        found: day,
        allowed: `up to ${lastDay}`,
      });
  };
  check(hole.drilledOn, 'drilledOn');
  hole.waterLevels.forEach(({ measuredOn }, i) => check(measuredOn, 'waterLevels', i, 'measuredOn'));
  if (faults.length > 0)
    throw new AppError('invalid', 'Nothing is drilled or measured in the future.', { faults });
}
