import type { Actor } from '../access/actor';
import { surveyCan } from '../access/policy';
import { AppError } from '../errors';
import type { Interpretation, InterpretationState, ReviewEvent } from '../contract/interpretations';
import { ROLE_NAMES } from '../contract/roles';
import type { WholeInterpretation } from './interpretations-store';

export type Move = Exclude<ReviewEvent['kind'], 'superseded' | 'commented' | 'edited'>;

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

/** Its author edits it; others do where they could submit it as well. Null = the actor may. */
export function editRefusal(actor: Actor, { row }: WholeInterpretation): string | null {
  if (row.author_id === actor.userId || surveyCan(row.role).submit) return null;
  return `As ${ROLE_NAMES[row.role]} of this survey you may edit only interpretations of your own; this one is ${row.author_name}’s.`;
}

/** Only what has left no history is ever deleted. Null = the actor may. */
export function discardRefusal(actor: Actor, { row, events }: WholeInterpretation): AppError | null {
  if (row.author_id !== actor.userId && row.role !== 'lead')
    return new AppError(
      'forbidden',
      'Only its author or a lead of the survey may discard an interpretation.',
    );
  if (row.state !== 'draft')
    return new AppError('wrong-state', `It cannot be discarded: ${STATE_WORDS[row.state]}.`);
  if (events.some(({ kind }) => kind === 'submitted'))
    return new AppError(
      'wrong-state',
      'It cannot be discarded: it was submitted once, and what was submitted is kept.',
    );
  if (events.length > 0)
    return new AppError(
      'wrong-state',
      'It cannot be discarded: it was commented on or edited by others, and its history is kept.',
    );
  return null;
}

export function interpretationCan(actor: Actor, whole: WholeInterpretation): Interpretation['can'] {
  const { role, state } = whole.row;
  const can = surveyCan(role);
  return {
    edit: can.interpret && EDITABLE.includes(state) && editRefusal(actor, whole) === null,
    submit: can.submit && MOVES.submitted.from.includes(state),
    withdraw: can.submit && MOVES.withdrawn.from.includes(state),
    decide: can.decide && MOVES.accepted.from.includes(state) && decideRefusal(actor, whole) === null,
    comment: can.comment,
    discard: can.interpret && discardRefusal(actor, whole) === null,
  };
}
