import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { addressOf } from '../../app/addresses';
import type { SurveyCan } from '../../../server/contract/roles';
import type { RunSummary } from '../../../server/contract/runs';
import { Button } from '../../ui/button';
import { ledgerOrder } from './choose-run';
import { LedgerRow } from './ledger-row';

/** As many as Side by side can show. */
const MOST_COMPARED = 6;

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
  const [chosen, setChosen] = useState<readonly string[]>([]);
  const compare = () =>
    void navigate(`${addressOf('sideBySide', { soundingId })}?runs=${encodeURIComponent(chosen.join(','))}`);
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
            <Button size="small" onClick={compare} disabled={chosen.length < 2}>
              {chosen.length < 2 ? 'Choose another run' : `Side by side: ${chosen.length} runs`}
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
            mayChoose={chosen.length < MOST_COMPARED || chosen.includes(run.id)}
            can={can}
            onOpen={() => onOpen(run)}
            onChoose={(isChosen) => choose(run.id, isChosen)}
          />
        ))}
      </ul>
    </section>
  );
}
