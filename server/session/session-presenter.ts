import type { z } from 'zod';
import type { SessionRow } from '../access/sessions';
import type { sessionSchema } from '../contract/session';

export const presentSession = (row: SessionRow, currentId: string): z.infer<typeof sessionSchema> => ({
  // the stored id is a hash of the cookie's secret; a part of it tells sessions apart and opens nothing
  handle: row.id.slice(0, 12),
  createdAt: row.created_at.toISOString(),
  expiresAt: row.expires_at.toISOString(),
  userAgent: row.user_agent,
  current: row.id === currentId,
});
