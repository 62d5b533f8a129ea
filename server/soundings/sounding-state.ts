import type { SoundingState } from '../contract/soundings';
import { weightiestStateSql } from '../db/interpretation-weight';

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
 * How far a sounding has come, as an SQL expression over a row of `sounding`: the weightiest state of its
 * interpretations, so that no newer draft hides a decision or a wait for one; else whether a run has finished; else
 * whether readings are saved.
 */
export const SOUNDING_STATE_SQL = `coalesce(
  ${weightiestStateSql('interpretation.sounding_id = sounding.id')},
  CASE
    WHEN sounding.current_revision_id IS NULL THEN 'no-readings'
    WHEN EXISTS (SELECT 1 FROM run JOIN run_state ON run_state.run_id = run.id
      WHERE run.sounding_id = sounding.id AND run_state.state = 'finished') THEN 'fitted'
    ELSE 'measured'
  END)`;
