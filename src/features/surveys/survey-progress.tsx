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
    <div>
      <div aria-hidden className="relative h-1.5 overflow-hidden rounded-full bg-sunken">
        {steps.map((step) => (
          <span
            key={step.key}
            className={`absolute inset-y-0 left-0 ${FILL[step.key]}`}
            style={{ width: `${step.share * 100}%` }}
          />
        ))}
      </div>
      <dl className="mt-2 grid grid-cols-5 gap-x-2">
        {steps.map((step) => (
          <div key={step.key} className="flex min-w-0 flex-col-reverse">
            <dt className="flex items-center gap-1.5 text-xs text-muted sm:text-sm">
              <span
                aria-hidden
                className={`hidden size-2 shrink-0 rounded-sm border border-edge/60 sm:block ${FILL[step.key]}`}
              />
              <span className="min-w-0 wrap-anywhere">{step.label}</span>
            </dt>
            <dd className="figure text-lg leading-tight">{step.count}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
