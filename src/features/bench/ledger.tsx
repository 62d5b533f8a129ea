import { useNavigate } from 'react-router-dom';
import type { SurveyCan } from '../../../server/contract/roles';
import type { RunSummary } from '../../../server/contract/runs';
import { FEWEST_RUNS, MOST_RUNS, sideBySideAddress, tickedRuns, useTickedRuns } from '../../runs/ticked-runs';
import { Button } from '../../ui/button';
import { ledgerOrder } from './choose-run';
import { LedgerRow } from './ledger-row';

export interface LedgerProps {
  soundingId: string;
  runs: readonly RunSummary[];
  shownRunId: string | null;
  can: SurveyCan;
  onOpen: (run: RunSummary) => void;
}

/** Every run of the sounding; nothing in it is ever written over. */
export function Ledger({ soundingId, runs, shownRunId, can, onOpen }: LedgerProps) {
  const navigate = useNavigate();
  const chosen = useTickedRuns((store) => tickedRuns(store, soundingId));
  const tick = useTickedRuns((store) => store.tick);
  const setChosen = (runIds: readonly string[]) => tick(soundingId, runIds);
  const compare = () => void navigate(sideBySideAddress(soundingId, chosen));
  const choose = (runId: string, isChosen: boolean) =>
    setChosen(isChosen ? [...chosen, runId] : chosen.filter((id) => id !== runId));
  return (
    <section aria-labelledby="ledger-title">
      <div className="flex items-center justify-between gap-3 pb-2">
        <h2 id="ledger-title" className="font-semibold">
          Ledger
        </h2>
        {chosen.length > 0 ? (
          <span className="flex items-center gap-2">
            <Button kind="quiet" size="small" onClick={() => setChosen([])}>
              Clear
            </Button>
            <Button size="small" onClick={compare} disabled={chosen.length < FEWEST_RUNS}>
              {chosen.length < FEWEST_RUNS ? 'Choose another run' : `Side by side: ${chosen.length} runs`}
            </Button>
          </span>
        ) : null}
      </div>
      <ul className="border-t border-rule">
        {ledgerOrder(runs).map((run) => (
          <LedgerRow
            key={run.id}
            run={run}
            runs={runs}
            isShown={run.id === shownRunId}
            isChosen={chosen.includes(run.id)}
            mayChoose={chosen.length < MOST_RUNS || chosen.includes(run.id)}
            can={can}
            onOpen={() => onOpen(run)}
            onChoose={(isChosen) => choose(run.id, isChosen)}
          />
        ))}
      </ul>
    </section>
  );
}
