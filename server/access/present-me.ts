import type { Me } from '../contract/session';
import type { Actor } from './actor';

/** The signed-in person as the browser sees them. */
export const presentMe = (person: { id: string; email: string; name: string; isAdmin: boolean }): Me => ({
  id: person.id,
  email: person.email,
  name: person.name,
  isAdmin: person.isAdmin,
  can: { createSurveys: true, administer: person.isAdmin },
});

export const presentActor = (actor: Actor): Me => presentMe({ ...actor, id: actor.userId });
