import type { Actor } from '../access/actor';
import type { Interpretation, InterpretationBed } from '../contract/interpretations';
import { decideRefusal, interpretationCan } from './interpretation-rules';
import type { BedRow, WholeInterpretation } from './interpretations-store';

export const presentBed = (bed: BedRow): InterpretationBed => ({
  layerIndex: bed.layer_index,
  ground: bed.ground,
  role: bed.role,
  confidence: bed.confidence,
  otherCandidates: bed.other_candidates,
});

export function presentInterpretation(actor: Actor, whole: WholeInterpretation): Interpretation {
  const { row, beds, events } = whole;
  return {
    id: row.id,
    soundingId: row.sounding_id,
    runId: row.run_id,
    runNumber: row.run_number,
    author: { id: row.author_id, name: row.author_name },
    title: row.title,
    narrative: row.narrative,
    waterLevelDepthM: row.water_level_depth_m,
    beds: beds.map(presentBed),
    state: row.state,
    version: row.version,
    createdAt: row.created_at.toISOString(),
    updatedAt: row.updated_at.toISOString(),
    events: events.map((event) => ({
      id: event.id,
      kind: event.kind,
      actor: { id: event.actor_id, name: event.actor_name },
      at: event.at.toISOString(),
      comment: event.comment,
    })),
    can: interpretationCan(actor, whole),
    decideRefusal: decideRefusal(actor, whole),
  };
}
