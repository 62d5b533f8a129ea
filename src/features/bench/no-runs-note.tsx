import type { SurveyCan } from '../../../server/contract/roles';
import { WHO_ASKS_FOR_RUNS } from '../../ui/role-words';

/** The Ledger before its first run. */
export function NoRunsNote({ can }: { can: SurveyCan }) {
  return (
    <section aria-labelledby="ledger-title">
      <h2 id="ledger-title" className="font-semibold">
        Ledger
      </h2>
      <p className="mt-1 text-muted">
        {can.run
          ? 'No run yet. “Fit beds” asks for the first; every run stays here, with its readings and settings as they were.'
          : `No run yet; ${WHO_ASKS_FOR_RUNS} of the survey asks for the first.`}
      </p>
    </section>
  );
}
