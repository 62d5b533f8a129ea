import type { SoundingState } from '../contract/soundings';

/** From the first to the last, as a table sorts them. */
export const SOUNDING_STATES: readonly SoundingState[] = [
  'no-readings',
  'measured',
  'fitted',
  'draft',
  'changes-asked',
  'in-review',
  'accepted',
];

/**
 * How far a sounding has come, as an SQL expression over a row of `sounding`: accepted where one interpretation is,
 * else the state of the interpretation touched last, else whether a run has finished, else whether readings are saved.
 */
export const SOUNDING_STATE_SQL = `coalesce(
  (SELECT interpretation.state FROM interpretation
    WHERE interpretation.sounding_id = sounding.id AND interpretation.state <> 'superseded'
    ORDER BY interpretation.state = 'accepted' DESC, interpretation.updated_at DESC LIMIT 1),
  CASE
    WHEN sounding.current_revision_id IS NULL THEN 'no-readings'
    WHEN EXISTS (SELECT 1 FROM run JOIN run_state ON run_state.run_id = run.id
      WHERE run.sounding_id = sounding.id AND run_state.state = 'finished') THEN 'fitted'
    ELSE 'measured'
  END)`;
