import type { Actor } from '../access/actor';
import { surveyCan } from '../access/policy';
import type { Interpretation, InterpretationState, ReviewEvent } from '../contract/interpretations';
import type { WholeInterpretation } from './interpretations-store';

export type Move = Exclude<ReviewEvent['kind'], 'superseded' | 'commented'>;

/** The course of an interpretation: from which states each move leads, and to which. */
export const MOVES: Record<Move, { from: readonly InterpretationState[]; to: InterpretationState }> = {
  submitted: { from: ['draft', 'changes-asked'], to: 'in-review' },
  withdrawn: { from: ['in-review'], to: 'draft' },
  'changes-asked': { from: ['in-review'], to: 'changes-asked' },
  accepted: { from: ['in-review'], to: 'accepted' },
};

export const EDITABLE: readonly InterpretationState[] = MOVES.submitted.from;

export const STATE_WORDS: Record<InterpretationState, string> = {
  draft: 'it is a draft',
  'in-review': 'it is in review',
  'changes-asked': 'changes were asked for',
  accepted: 'it is accepted',
  superseded: 'a newer one was accepted in its place',
};

/** Nobody decides on their own work: neither on words they wrote or submitted, nor on a run they asked for. */
export function decideRefusal(actor: Actor, { row, contributorIds }: WholeInterpretation): string | null {
  if (!surveyCan(row.role).decide) return null;
  if (contributorIds.has(actor.userId))
    return 'You wrote or submitted this interpretation, so another hydrogeologist has to decide on it.';
  if (row.run_requester_id === actor.userId)
    return 'You asked for the run this interpretation stands on, so another hydrogeologist has to decide on it.';
  return null;
}

export function interpretationCan(actor: Actor, whole: WholeInterpretation): Interpretation['can'] {
  const { role, state } = whole.row;
  const can = surveyCan(role);
  return {
    edit: can.interpret && EDITABLE.includes(state),
    submit: can.submit && MOVES.submitted.from.includes(state),
    withdraw: can.submit && MOVES.withdrawn.from.includes(state),
    decide: can.decide && MOVES.accepted.from.includes(state) && decideRefusal(actor, whole) === null,
    comment: can.comment,
  };
}
