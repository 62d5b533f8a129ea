import { fitEarth } from '../../inversion/index';
import { fitResultSchema } from '../contract/fit-result';
import { fitSettingsSchema, type FitSettingsInput } from '../contract/fit-settings';
import type { Work } from '../http/context';
import { storeResult, takeRun } from '../jobs/run-lease';
import { changeRunNote, requestRun } from '../runs/runs-service';
import type { As } from './load-demo';
import { INTERPRETATIONS } from './interpretations';

/** Left for whoever tries the product. */
const NOT_FITTED = ['S-05', 'S-16', 'S-23', 'S-24'];

/** Runs that show something beside the usual one: their settings and what is noted on them. */
const FURTHER_RUNS: Record<string, { layers: number; label: string; note: string }[]> = {
  'S-07': [{ layers: 3, label: 'without the clay', note: 'Too few beds: the residuals wander.' }],
  'S-10': [
    {
      layers: 3,
      label: 'three beds',
      note: 'Too few beds; the middle MN branch stands high as well, see the checks.',
    },
  ],
  'S-12': [
    {
      layers: 4,
      label: 'with weathered rock',
      note: 'Closer still, though two beds are within the noise already.',
    },
  ],
};

/**
 * Runs by their number of layers, as ids. What was tried on the way comes first: the newest run stands for a sounding
 * that nobody has interpreted, and that is to be the automatic choice. Last comes what the interpretation needs beside.
 */
export async function loadRuns(as: As, soundingId: string, name: string): Promise<Map<number, string>> {
  const ids = new Map<number, string>();
  if (NOT_FITTED.includes(name)) return ids;
  const work = as('geophysicist');
  for (const { layers, label, note } of FURTHER_RUNS[name] ?? []) {
    const run = await finishRun(work, soundingId, { kind: 'layered', layers });
    await changeRunNote(work, run.id, run.noteVersion, { label, note });
    ids.set(layers, run.id);
  }
  const found = await finishRun(work, soundingId, { kind: 'layered', layers: 'auto' });
  ids.set(found.layers, found.id);
  for (const { layers } of INTERPRETATIONS.filter(({ sounding }) => sounding === name))
    if (!ids.has(layers))
      ids.set(layers, (await finishRun(work, soundingId, { kind: 'layered', layers })).id);
  return ids;
}

/** Asks for a run and computes it here: the queue's workers cannot see a transaction that is still open. */
async function finishRun(
  work: Work,
  soundingId: string,
  settings: FitSettingsInput,
): Promise<{ id: string; layers: number; noteVersion: number }> {
  const run = await requestRun(work, soundingId, { settings: fitSettingsSchema.parse(settings) });
  const lease = await takeRun(work, 'demo', run.id);
  if (!lease) throw new Error(`run ${run.id} of the demo could not be taken`);
  const startedAt = performance.now();
  const result = fitResultSchema.parse(fitEarth(lease.input.readings, lease.input.settings));
  await storeResult(work, lease, result, performance.now() - startedAt);
  await work.db.transaction((trx) => work.jobs.dropRun(trx, run.id));
  return { id: run.id, layers: result.earth.resistivity.length, noteVersion: run.note.version };
}
