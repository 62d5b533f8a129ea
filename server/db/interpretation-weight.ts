import { STANDING_STATES } from '../contract/interpretations';

/** Rank of a row of `interpretation`, 1 for the weightiest state; null for one that was superseded. */
const WEIGHT_SQL = `array_position(ARRAY['${STANDING_STATES.join("','")}'], interpretation.state)`;

/** State of the weightiest standing interpretation among those that `condition` selects, as an SQL expression. */
export const weightiestStateSql = (condition: string): string => `(SELECT interpretation.state
  FROM interpretation WHERE ${condition} AND interpretation.state <> 'superseded'
  ORDER BY ${WEIGHT_SQL} LIMIT 1)`;

/** The least rank among the interpretations that `condition` selects, as an SQL expression; null where none stands. */
export const leastWeightSql = (condition: string): string =>
  `(SELECT min(${WEIGHT_SQL}) FROM interpretation WHERE ${condition})`;

/** For the two above: interpretations of a row of `run`; both columns, as their index has them. */
export const OF_RUN_SQL = 'interpretation.sounding_id = run.sounding_id AND interpretation.run_id = run.id';
