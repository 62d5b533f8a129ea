import { changeInterpretation, createInterpretation } from '../interpretations/interpretations-service';
import { addReviewEvent } from '../interpretations/review-service';
import { INTERPRETATIONS } from './interpretations';
import type { As } from './load-demo';

/** What has been written of one sounding so far, on the runs given by their number of layers. */
export async function loadInterpretations(
  as: As,
  soundingId: string,
  name: string,
  runIds: ReadonlyMap<number, string>,
): Promise<void> {
  for (const { layers, title, narrative, beds, waterLevelDepthM, end, ...demo } of INTERPRETATIONS) {
    const runId = runIds.get(layers);
    if (demo.sounding !== name || runId === undefined) continue;
    const author = as('geophysicist');
    const { id, version } = await createInterpretation(author, soundingId, { runId, title });
    await changeInterpretation(author, id, version, {
      narrative,
      waterLevelDepthM,
      beds: beds.map((bed, layerIndex) => ({ layerIndex, ...bed })),
    });
    if (end === 'draft') continue;
    await addReviewEvent(author, id, { kind: 'submitted', comment: '' });
    if (end === 'accepted')
      await addReviewEvent(as('hydrogeologist'), id, {
        kind: 'accepted',
        comment: 'Agrees with the log beside it.',
      });
  }
}
