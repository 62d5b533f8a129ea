import type { Knex } from 'knex';
import type { Actor } from '../access/actor';
import type { FitResult } from '../contract/fit-result';
import type {
  BedConfidence,
  BedRole,
  InterpretationBed,
  InterpretationState,
  ReviewEvent,
} from '../contract/interpretations';
import type { Role } from '../contract/roles';
import { notFound } from '../errors';

export interface InterpretationRow {
  id: string;
  sounding_id: string;
  survey_id: string;
  run_id: string;
  run_number: number;
  run_requester_id: string;
  author_id: string;
  author_name: string;
  title: string;
  narrative: string;
  water_level_depth_m: number | null;
  state: InterpretationState;
  version: number;
  created_at: Date;
  updated_at: Date;
  /** of the actor in the survey */
  role: Role;
}

export interface BedRow {
  interpretation_id: string;
  layer_index: number;
  ground: string;
  role: BedRole;
  confidence: BedConfidence;
  other_candidates: string;
}

export interface EventRow {
  id: string;
  interpretation_id: string;
  kind: ReviewEvent['kind'];
  actor_id: string;
  actor_name: string;
  at: Date;
  comment: string;
}

/** An interpretation with all that is shown of it. */
export interface WholeInterpretation {
  readonly row: InterpretationRow;
  readonly beds: readonly BedRow[];
  readonly events: readonly EventRow[];
  readonly contributorIds: ReadonlySet<string>;
}

const visibleInterpretations = (knex: Knex, actor: Actor) =>
  knex('interpretation')
    .join('run', 'run.id', 'interpretation.run_id')
    .join('sounding', 'sounding.id', 'interpretation.sounding_id')
    .join('survey_member', 'survey_member.survey_id', 'sounding.survey_id')
    .join('app_user', 'app_user.id', 'interpretation.author_id')
    .where('survey_member.user_id', actor.userId)
    .select<InterpretationRow[]>(
      'interpretation.*',
      'sounding.survey_id',
      'run.number as run_number',
      'run.requested_by as run_requester_id',
      'app_user.name as author_name',
      'survey_member.role',
    );

/** Newest first. */
export async function listInterpretations(
  knex: Knex,
  actor: Actor,
  soundingId: string,
): Promise<WholeInterpretation[]> {
  const rows = await visibleInterpretations(knex, actor)
    .where('interpretation.sounding_id', soundingId)
    .orderBy('interpretation.created_at', 'desc');
  return withParts(knex, rows);
}

export async function getInterpretation(
  knex: Knex,
  actor: Actor,
  interpretationId: string,
): Promise<WholeInterpretation> {
  const rows = await visibleInterpretations(knex, actor).where('interpretation.id', interpretationId);
  const [whole] = await withParts(knex, rows);
  if (!whole) throw notFound('The interpretation');
  return whole;
}

async function withParts(knex: Knex, rows: readonly InterpretationRow[]): Promise<WholeInterpretation[]> {
  const ids = rows.map((row) => row.id);
  const beds = await knex<BedRow>('interpretation_bed')
    .whereIn('interpretation_id', ids)
    .orderBy('layer_index');
  const events = await knex('review_event')
    .join('app_user', 'app_user.id', 'review_event.actor_id')
    .whereIn('review_event.interpretation_id', ids)
    .orderBy('review_event.id')
    .select<EventRow[]>(
      'review_event.id',
      'review_event.interpretation_id',
      'review_event.kind',
      'review_event.actor_id',
      'app_user.name as actor_name',
      'review_event.at',
      'review_event.comment',
    );
  const contributors = await knex<{ interpretation_id: string; user_id: string }>(
    'interpretation_contributor',
  ).whereIn('interpretation_id', ids);
  const of = <T extends { interpretation_id: string }>(parts: readonly T[], id: string): T[] =>
    parts.filter((part) => part.interpretation_id === id);
  return rows.map((row) => ({
    row,
    beds: of(beds, row.id),
    events: of(events, row.id),
    contributorIds: new Set(of(contributors, row.id).map((one) => one.user_id)),
  }));
}

export interface InterpretedRun {
  state: string;
  result: FitResult | null;
}

/** The run when it is one of this sounding. */
export async function findRunOfSounding(
  knex: Knex,
  soundingId: string,
  runId: string,
): Promise<InterpretedRun | null> {
  const row = await knex('run')
    .join('run_state', 'run_state.run_id', 'run.id')
    .leftJoin('computation', 'computation.id', 'run_state.computation_id')
    .where({ 'run.id': runId, 'run.sounding_id': soundingId })
    .first<InterpretedRun | undefined>('run_state.state', 'computation.result');
  return row ?? null;
}

export async function insertInterpretation(
  trx: Knex,
  given: { soundingId: string; runId: string; authorId: string; title: string; layers: number },
): Promise<string> {
  const [made] = await trx('interpretation')
    .insert({
      sounding_id: given.soundingId,
      run_id: given.runId,
      author_id: given.authorId,
      title: given.title,
    })
    .returning<{ id: string }[]>('id');
  if (!made) throw new Error('an interpretation was not inserted');
  await trx('interpretation_bed').insert(
    Array.from({ length: given.layers }, (_, layer) => ({ interpretation_id: made.id, layer_index: layer })),
  );
  return made.id;
}

export async function addContributor(trx: Knex, interpretationId: string, userId: string): Promise<void> {
  await trx('interpretation_contributor')
    .insert({ interpretation_id: interpretationId, user_id: userId })
    .onConflict(['interpretation_id', 'user_id'])
    .ignore();
}

/** With its beds and contributors; the database refuses it where review events are. */
export async function deleteInterpretation(trx: Knex, interpretationId: string): Promise<void> {
  await trx('interpretation').where({ id: interpretationId }).delete();
}

export interface Statement {
  title?: string | undefined;
  narrative?: string | undefined;
  waterLevelDepthM?: number | null | undefined;
  beds?: readonly InterpretationBed[] | undefined;
}

/** False when it has another version by now. */
export async function updateStatement(
  trx: Knex,
  interpretationId: string,
  version: number,
  { title, narrative, waterLevelDepthM, beds = [] }: Statement,
): Promise<boolean> {
  const rows = await trx('interpretation')
    .where({ id: interpretationId, version })
    .update({
      title,
      narrative,
      water_level_depth_m: waterLevelDepthM,
      version: version + 1,
      updated_at: trx.fn.now(),
    });
  if (rows === 0) return false;
  for (const { layerIndex, ground, role, confidence, otherCandidates } of beds)
    await trx('interpretation_bed')
      .where({ interpretation_id: interpretationId, layer_index: layerIndex })
      .update({ ground, role, confidence, other_candidates: otherCandidates });
  return true;
}
