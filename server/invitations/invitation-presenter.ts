import type { z } from 'zod';
import type { invitationOfferSchema } from '../contract/session';
import type { invitationSchema } from '../contract/surveys';
import type { InvitationRow, OfferRow } from './invitation-store';

type Invitation = z.infer<typeof invitationSchema>;

export const presentInvitation = (row: InvitationRow): Invitation => ({
  id: row.id,
  email: row.email,
  role: row.role,
  invitedBy: { id: row.inviter_id, name: row.inviter_name },
  createdAt: row.created_at.toISOString(),
  expiresAt: row.expires_at.toISOString(),
  state: stateOf(row),
});

export const presentOffer = (row: OfferRow): z.infer<typeof invitationOfferSchema> => ({
  email: row.email,
  surveyName: row.survey_name,
  role: row.role,
  invitedBy: row.inviter_name,
  hasAccount: row.has_account,
  expiresAt: row.expires_at.toISOString(),
});

function stateOf(row: InvitationRow): Invitation['state'] {
  if (row.accepted_at) return 'accepted';
  if (row.revoked_at) return 'revoked';
  return row.expires_at.getTime() < Date.now() ? 'expired' : 'open';
}
