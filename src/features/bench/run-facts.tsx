import type { SurveyCan } from '../../../server/contract/roles';
import type { Run, RunSummary } from '../../../server/contract/runs';
import { fitStatusMessage } from '../../../inversion';
import { messageOf } from '../../api/api-error';
import { addressOf } from '../../app/addresses';
import { answerFact } from '../../runs/cache-words';
import { hasBeds } from '../../runs/run-standing';
import { settingsWords } from '../../runs/run-settings-words';
import { letterOfRun } from '../../runs/run-title';
import { Button, ButtonLink } from '../../ui/button';
import { formatMoment } from '../../ui/format';
import { Sentence } from '../../ui/sentence';
import { showToast } from '../../ui/show-toast';
import { useRecomputeRun } from './bench-mutations';
import { RecomputationVerdict } from './recomputation-verdict';

export interface RunFactsProps {
  run: Run;
  runs: readonly RunSummary[];
  can: SurveyCan;
}

/** What the shown run was asked for and how it ended, and what can follow from it. */
export function RunFacts({ run, runs, can }: RunFactsProps) {
  const recompute = useRecomputeRun(run.soundingId);
  const letter = letterOfRun(run);
  const { outcome } = run;
  const facts = [
    ...settingsWords(run.settings),
    { label: 'Readings', value: `revision ${run.revisionNumber}, ${run.readings.length} used` },
    { label: 'Asked by', value: `${run.requestedBy.name}, ${formatMoment(run.requestedAt)}` },
    answerFact(run, runs),
  ];
  return (
    <section aria-labelledby="run-facts-title">
      <h2 id="run-facts-title" className="font-semibold">
        Run {letter}
      </h2>
      {run.note.note === '' ? null : <p className="mt-1 whitespace-pre-wrap">{run.note.note}</p>}
      <RecomputationVerdict run={run} runs={runs} />
      <dl className="mt-2 grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-0.5 text-sm">
        {facts.map((fact) => (
          <div key={fact.label} className="contents">
            <dt className="text-muted">{fact.label}</dt>
            <dd>
              <Sentence text={fact.value} />
            </dd>
          </div>
        ))}
      </dl>
      {outcome ? <p className="mt-1.5 text-sm text-muted">{fitStatusMessage(outcome.status)}</p> : null}
      {can.interpret && outcome && !hasBeds(run) ? (
        <p className="mt-1.5 text-sm text-muted">
          Cells are no beds, and an interpretation names beds. Fit beds to interpret.
        </p>
      ) : null}
      <div className="mt-3 flex flex-wrap gap-2">
        {can.interpret && hasBeds(run) ? (
          <ButtonLink
            size="small"
            to={`${addressOf('interpretations', { soundingId: run.soundingId })}?start=${run.id}`}
          >
            Interpret this run
          </ButtonLink>
        ) : null}
        {can.recompute ? (
          <Button
            size="small"
            loading={recompute.isPending}
            onClick={() =>
              recompute.mutate(run.id, {
                onError: (error) =>
                  showToast({
                    kind: 'bad',
                    title: `Run ${letter} was not computed again`,
                    description: messageOf(error),
                  }),
              })
            }
          >
            Compute again
          </Button>
        ) : null}
      </div>
    </section>
  );
}
