import { performance } from 'node:perf_hooks';
import type { Knex } from 'knex';
import type { Actor } from '../access/actor';
import { hashPassword } from '../access/password';
import { createBorehole } from '../boreholes/borehole-service';
import type { Role } from '../contract/roles';
import type { Work } from '../http/context';
import type { JobQueue } from '../jobs/job-queue';
import type { RunEvents } from '../jobs/run-events';
import { createLine } from '../lines/line-service';
import { createSounding } from '../soundings/sounding-service';
import { createSurvey } from '../surveys/survey-service';
import { loadInterpretations } from './load-interpretations';
import { loadReadings } from './load-readings';
import { loadRuns } from './load-runs';
import { BOREHOLES, DEMO_PASSWORD, LAST_FIELD_DAY, LINES, PEOPLE, SOUNDINGS, SURVEY } from './scenario';

export interface DemoAccount {
  readonly email: string;
  readonly password: string;
  readonly role: string;
}

export interface LoadedDemo {
  /** whether it was loaded now */
  readonly loaded: boolean;
  readonly accounts: readonly DemoAccount[];
  readonly seconds: number;
}

export interface DemoServices {
  readonly db: Knex;
  readonly jobs: JobQueue;
  readonly runEvents: RunEvents;
}

/** The demo's people and survey, through the same services as any request; all of it or nothing, and only into an empty database. */
export async function loadDemo({ db, jobs, runEvents }: DemoServices): Promise<LoadedDemo> {
  const startedAt = performance.now();
  const loaded = await db.transaction(async (trx) => {
    await trx.raw("SELECT pg_advisory_xact_lock(hashtext('layerwell demo'))");
    if (await trx('app_user').first('id')) return false;
    const actors = await addPeople(trx);
    await loadSurvey(actors, (role) => ({ db: trx, jobs, runEvents, actor: actors[role] }));
    return true;
  });
  return { loaded, accounts: await demoAccounts(db), seconds: (performance.now() - startedAt) / 1000 };
}

type Actors = Record<Role | 'admin', Actor>;
/** Work done as one of the demo's people. */
export type As = (role: Role) => Work;

async function addPeople(trx: Knex): Promise<Actors> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const entries: [string, Actor][] = [];
  for (const { email, name, role } of PEOPLE) {
    const isAdmin = role === 'admin';
    const [row] = await trx('app_user')
      .insert({ email, name, password_hash: passwordHash, is_admin: isAdmin })
      .returning<{ id: string }[]>('id');
    if (!row) throw new Error(`the account ${email} was not returned`);
    entries.push([role, { userId: row.id, email, name, isAdmin, sessionId: '' }]);
  }
  return Object.fromEntries(entries) as Actors;
}

async function loadSurvey(actors: Actors, as: As): Promise<void> {
  const survey = await createSurvey(as('lead'), { ...SURVEY, epsgCode: null });
  for (const role of ['geophysicist', 'hydrogeologist', 'analyst', 'guest'] as const)
    await as('lead').db('survey_member').insert({ survey_id: survey.id, user_id: actors[role].userId, role });
  const lineIds = new Map<string, string>();
  for (const name of LINES) lineIds.set(name, (await createLine(as('lead'), survey.id, name)).id);
  for (const hole of BOREHOLES)
    await createBorehole(
      as('hydrogeologist'),
      survey.id,
      { ...hole, intervals: [...hole.intervals], waterLevels: [...hole.waterLevels] },
      LAST_FIELD_DAY,
    );
  for (const sounding of SOUNDINGS) {
    const { name, xM, yM, elevationM, azimuthDeg, measuredOn, note = '' } = sounding;
    const { id } = await createSounding(as('geophysicist'), survey.id, {
      name,
      xM,
      yM,
      elevationM,
      azimuthDeg,
      measuredOn,
      note,
      lineId: lineIds.get(sounding.line) ?? null,
      spreadType: sounding.array,
      elevationDatum: 'village benchmark, 390.00 m',
      crew: 'Crew 2',
      instrument: 'four-electrode meter no. 3, 400 V',
    });
    await loadReadings(as, id, sounding);
    const runIds = await loadRuns(as, id, sounding.name);
    await loadInterpretations(as, id, sounding.name, runIds);
  }
}

/** The demo's accounts that are still there and open, as the start command prints them. */
async function demoAccounts(db: Knex): Promise<DemoAccount[]> {
  const open = await db('app_user')
    .whereIn(
      'email',
      PEOPLE.map(({ email }) => email),
    )
    .whereNull('disabled_at')
    .pluck<string[]>('email');
  return PEOPLE.filter(({ email }) => open.includes(email)).map(({ email, role }) => ({
    email,
    password: DEMO_PASSWORD,
    role,
  }));
}
