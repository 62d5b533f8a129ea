import type { Run } from '../../../server/contract/runs';
import { settingsWords } from '../../runs/run-settings-words';

const GIVEN = ['Held', 'Known beforehand', 'Branches', 'Outliers'];

/** What the person who asked for the run gave it beside the readings; every other value follows from it. */
export function RunGivens({ run }: { run: Run }) {
  const given = settingsWords(run.settings).filter(({ label }) => GIVEN.includes(label));
  return (
    <section aria-labelledby="run-givens-title">
      <h2 id="run-givens-title" className="font-semibold">
        Given beside the readings
      </h2>
      {given.length === 0 ? (
        <p>Nothing: no value is held, and none was known beforehand.</p>
      ) : (
        <dl>
          {given.map(({ label, value }) => (
            <div key={label}>
              <dt className="mr-2 inline text-muted">{label}</dt>
              <dd className="inline">{value}</dd>
            </div>
          ))}
        </dl>
      )}
    </section>
  );
}
