import { createHash, randomUUID } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { Knex } from 'knex';
import { hashPassword } from '../../server/access/password';
import { createToken } from '../../server/access/secret-token';
import type { Reading } from '../../server/contract/readings';
import type { Role } from '../../server/contract/roles';
import type { SpreadType } from '../../server/contract/spread';

export const TEST_PASSWORD = 'correct horse battery';

export interface TestUser {
  readonly id: string;
  readonly email: string;
  readonly name: string;
}

export interface Factories {
  createUser(given?: Partial<{ email: string; name: string; isAdmin: boolean }>): Promise<TestUser>;
  addMember(surveyId: string, userId: string, role: Role): Promise<void>;
  /** a survey without any member */
  createSurvey(name?: string): Promise<{ id: string }>;
  createLine(surveyId: string, name?: string): Promise<{ id: string }>;
  createBorehole(surveyId: string, name?: string): Promise<{ id: string }>;
  /** an open invitation of a new address as guest */
  createInvitation(
    surveyId: string,
    inviterId: string,
    given?: { email?: string; role?: Role },
  ): Promise<{ id: string; token: string; email: string }>;
  createSounding(
    surveyId: string,
    given?: Partial<{ name: string; spreadType: SpreadType; lineId: string }>,
  ): Promise<{ id: string }>;
  /** saved readings that become the sounding's current revision */
  createRevision(soundingId: string, authorId: string, readings?: Reading[]): Promise<{ id: string }>;
}

// hashing is slow on purpose: once for all test users
let passwordHash: Promise<string> | null = null;

export function createFactories(db: Knex): Factories {
  const insert = async (table: string, row: object): Promise<{ id: string }> => {
    const [made] = await db(table).insert(row).returning<{ id: string }[]>('id');
    if (!made) throw new Error(`nothing was inserted into ${table}`);
    return { id: made.id };
  };
  const unique = (what: string): string => `${what} ${randomUUID().slice(0, 8)}`;
  return {
    async createUser(given = {}) {
      passwordHash ??= hashPassword(TEST_PASSWORD);
      const email = given.email ?? `${randomUUID()}@example.test`;
      const name = given.name ?? unique('Person');
      const row = { email, name, password_hash: await passwordHash, is_admin: given.isAdmin ?? false };
      return { ...(await insert('app_user', row)), email, name };
    },
    async addMember(surveyId, userId, role) {
      await db('survey_member').insert({ survey_id: surveyId, user_id: userId, role });
    },
    createSurvey: (name = unique('Survey')) => insert('survey', { name }),
    createLine: (surveyId, name = unique('Line')) => insert('line', { survey_id: surveyId, name }),
    createBorehole: (surveyId, name = unique('Borehole')) =>
      insert('borehole', { survey_id: surveyId, name, depth_m: 80 }),
    async createInvitation(surveyId, inviterId, given = {}) {
      const { token, hash } = createToken();
      const email = given.email ?? `${randomUUID()}@example.test`;
      const { id } = await insert('invitation', {
        email,
        survey_id: surveyId,
        role: given.role ?? 'guest',
        token_hash: hash,
        invited_by: inviterId,
        expires_at: db.raw("now() + interval '14 days'"),
      });
      return { id, token, email };
    },
    createSounding: (surveyId, given = {}) =>
      insert('sounding', {
        survey_id: surveyId,
        name: given.name ?? unique('Sounding'),
        spread_type: given.spreadType ?? 'schlumberger',
        line_id: given.lineId ?? null,
      }),
    async createRevision(soundingId, authorId, readings = threeLayerReadings()) {
      const last = await db('data_revision')
        .where({ sounding_id: soundingId })
        .max<{ number: number | null }[]>('number as number');
      const revision = await insert('data_revision', {
        sounding_id: soundingId,
        number: (last[0]?.number ?? 0) + 1,
        content_hash: createHash('sha256')
          .update(canonicalize(readings) ?? '')
          .digest('hex'),
        readings: JSON.stringify(readings),
        author_id: authorId,
      });
      await db('sounding').where({ id: soundingId }).update({ current_revision_id: revision.id });
      return revision;
    },
  };
}

/** A plausible Schlumberger curve, high over low over high; figures made for the tests. */
export function threeLayerReadings(): Reading[] {
  const curve: [halfAB: number, halfMN: number, apparentResistivity: number][] = [
    [1.5, 0.5, 118],
    [2.5, 0.5, 112],
    [4, 0.5, 97],
    [6, 0.5, 76],
    [10, 0.5, 47],
    [15, 0.5, 33],
    [25, 5, 28],
    [40, 5, 34],
    [60, 5, 46],
    [100, 5, 69],
    [150, 5, 93],
    [200, 5, 113],
  ];
  return curve.map(([halfAB, halfMN, apparentResistivity]) => ({
    spread: { type: 'schlumberger', halfAB, halfMN },
    voltageMv: null,
    currentMa: null,
    resistanceOhm: null,
    sheetApparentResistivityOhmM: apparentResistivity,
    standardError: 0.02,
    remark: '',
    excluded: null,
  }));
}
