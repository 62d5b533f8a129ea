import { useId } from 'react';
import { classNames } from '../ui/class-names';
import { rampStops } from './resistivity-ramp';

/** In a very narrow place the second largest gives way, so that no two numbers touch. */
const MARKS = ['1', '10', '100', '1000', '10\u202f000'];
const PLACE: Record<number, string> = { 0: 'justify-start', 4: 'justify-end' };

/** The one ramp of the product, 1 to 10 000 Ω·m; in a narrow place the heading above it tells the unit. */
export function ResistivityLegend({ className }: { className?: string }) {
  const gradientId = useId();
  return (
    <div className={classNames('@container w-full max-w-80', className)}>
      <div className="flex gap-2.5">
        <div className="@container min-w-0 flex-1">
          <svg
            role="img"
            aria-label="Colours of resistivity, from dark blue at 1 through teal, green and ochre to cream at 10 000 ohm metres"
            className="block h-2.5 w-full border border-rule"
          >
            <defs>
              <linearGradient id={gradientId}>
                {rampStops().map(({ offset, color }) => (
                  <stop key={offset} offset={offset} stopColor={color} />
                ))}
              </linearGradient>
            </defs>
            <rect width="100%" height="100%" fill={`url(#${gradientId})`} />
          </svg>
          <div aria-hidden className="figure flex justify-between pt-1 text-xs text-muted">
            {MARKS.map((mark, index) => (
              <span
                key={mark}
                className={classNames(
                  'flex w-0 whitespace-nowrap',
                  PLACE[index] ?? 'justify-center',
                  index === 3 && 'invisible @min-[15.25rem]:visible',
                )}
              >
                {mark}
              </span>
            ))}
          </div>
        </div>
        <span aria-hidden className="figure -mt-0.5 hidden text-xs text-muted @2xs:inline">
          Ω·m
        </span>
      </div>
    </div>
  );
}
