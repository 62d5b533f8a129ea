import type { z } from 'zod';
import type { memberSchema } from '../contract/surveys';
import type { MemberRow } from './member-store';

export const presentMember = (row: MemberRow): z.infer<typeof memberSchema> => ({
  user: { id: row.user_id, name: row.name, email: row.email },
  role: row.role,
  joinedAt: row.joined_at.toISOString(),
});
