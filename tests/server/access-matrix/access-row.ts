import type { Role } from '../../../server/contract/roles';
import type { Client, TestServer } from '../../setup/server';

export const ROLES = ['lead', 'geophysicist', 'hydrogeologist', 'analyst', 'guest'] as const satisfies Role[];
export const WHO = ['nobody', 'outsider', 'admin', ...ROLES] as const;
export type Who = (typeof WHO)[number];

export interface Asked {
  readonly path: string;
  readonly body?: object;
  /** row version for If-Match */
  readonly version?: number;
  /** content of the multipart field `file` */
  readonly file?: { readonly name: string; readonly content: string };
}

/** What an endpoint answers to everyone. */
export interface AccessRow {
  /** method and path as declared, such as `GET /surveys/:surveyId` */
  readonly endpoint: string;
  readonly expected: Record<Who, number>;
  /**
   * Makes a fresh subject in `surveyId`, whose members have the five roles, and says what to send to it. `author` is a
   * member too (lead) and is none of those who ask.
   */
  arrange(given: {
    server: TestServer;
    surveyId: string;
    author: Client;
    asker: Client;
  }): Promise<Asked> | Asked;
}

type Expected = AccessRow['expected'];

const everyRole = (status: (role: Role) => number): Record<Role, number> =>
  Object.fromEntries(ROLES.map((role) => [role, status(role)])) as Record<Role, number>;

/** Every member reads; to anyone else it is not there. */
export const membersGet = (status = 200): Expected => ({
  nobody: 401,
  outsider: 404,
  admin: 404,
  ...everyRole(() => status),
});

/** Some roles may; the other members see it and may not. */
export const rolesGet = (status: number, ...roles: Role[]): Expected => ({
  nobody: 401,
  outsider: 404,
  admin: 404,
  ...everyRole((role) => (roles.includes(role) ? status : 403)),
});

export const signedInGet = (status: number): Expected => ({
  nobody: 401,
  outsider: status,
  admin: status,
  ...everyRole(() => status),
});

export const everyoneGets = (status: number): Expected => ({ ...signedInGet(status), nobody: status });

export const adminGets = (status: number): Expected => ({
  nobody: 401,
  outsider: 403,
  admin: status,
  ...everyRole(() => 403),
});
