import type { Survey } from '../../../server/contract/surveys';
import { progressSteps, type ProgressStep } from './progress-steps';

const FILL: Record<ProgressStep['key'], string> = {
  soundings: 'bg-sunken',
  measured: 'bg-rule',
  fitted: 'bg-edge/70',
  interpreted: 'bg-water/50',
  accepted: 'bg-water',
};

/** One fine bar: each step lies over the one before it, as far as it has come; the numbers stand below. */
export function SurveyProgress({ progress }: { progress: Survey['progress'] }) {
  const steps = progressSteps(progress);
  return (
    <div className="@container">
      <div aria-hidden className="relative h-1.5 overflow-hidden rounded-full bg-sunken">
        {steps.map((step) => (
          <span
            key={step.key}
            className={`absolute inset-y-0 left-0 ${FILL[step.key]}`}
            style={{ width: `${step.share * 100}%` }}
          />
        ))}
      </div>
      <dl className="mt-2 grid gap-x-2 @md:grid-cols-[repeat(5,auto)]">
        {steps.map((step) => (
          <div
            key={step.key}
            className="flex items-baseline justify-between gap-x-3 @md:flex-col-reverse @md:justify-end"
          >
            <dt className="flex items-center gap-1.5 text-sm text-muted">
              <span
                aria-hidden
                className={`size-2 shrink-0 rounded-sm border border-edge/60 ${FILL[step.key]}`}
              />
              {step.label}
            </dt>
            <dd className="figure leading-snug @md:text-lg">{step.count}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
