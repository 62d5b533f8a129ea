import request from 'supertest';
import { describe, expect, test } from 'vitest';
import { meSchema, sessionListSchema } from '../../server/contract/session';
import { TEST_PASSWORD } from '../setup/factories';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { nobody } = server;

const setCookie = (headers: Record<string, unknown>): string =>
  Array.isArray(headers['set-cookie']) ? String(headers['set-cookie'][0]) : '';

const signIn = (email: string, password: string) => nobody.post('/session', { email, password });

describe('signing in', () => {
  test('needs an address and a password', async () => {
    const answer = await nobody.post('/session', { email: 'not an address' });
    expect(answer.status).toBe(422);
    expect((answer.body as { faults: { path: string[] }[] }).faults.map((fault) => fault.path)).toEqual([
      ['body', 'email'],
      ['body', 'password'],
    ]);
  });

  test('tells an unknown address and a wrong password alike', async () => {
    const user = await server.createUser();
    const [wrong, unknown] = [
      await signIn(user.email, 'not the password'),
      await signIn('unknown@example.test', 'not the password'),
    ];
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    const { instance, detail, code } = wrong.body as Record<string, string>;
    expect(unknown.body).toMatchObject({ instance, detail, code });
  });

  test('works as hard for an unknown address as for a wrong password', async () => {
    const user = await server.createUser();
    // the processor's time of this process, which a busy machine does not stretch as it does a clock's
    const workOf = async (email: string) => {
      const start = process.cpuUsage();
      await signIn(email, 'not the password');
      const { user: own, system } = process.cpuUsage(start);
      return own + system;
    };
    await workOf(user.email);
    const known: number[] = [];
    const unknown: number[] = [];
    for (let i = 0; i < 7; i += 1) {
      known.push(await workOf(user.email));
      unknown.push(await workOf(`unknown${i}@example.test`));
    }
    const least = (works: number[]) => Math.min(...works);
    // without the comparison against nobody's hash an unknown address takes many times less
    expect(least(unknown)).toBeGreaterThan(least(known) * 0.4);
  });

  test('gives a session in a cookie that scripts cannot read', async () => {
    const user = await server.createUser();
    const answer = await signIn(user.email.toUpperCase(), TEST_PASSWORD);
    expect(answer.status).toBe(200);
    expect(meSchema.parse(answer.body)).toMatchObject({ id: user.id, email: user.email, isAdmin: false });
    const cookie = setCookie(answer.headers as Record<string, unknown>);
    expect(cookie).toMatch(/^layerwell_session=[\w-]{43};/);
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
    expect(cookie).toMatch(/Path=\//);
    expect(cookie).not.toMatch(/Secure/);
    const me = await request(server.app)
      .get('/api/v1/me')
      .set('Cookie', cookie.split(';')[0] ?? '');
    expect(me.body).toEqual(answer.body);
  });

  test('stores no secret: the stored id opens nothing', async () => {
    const client = await server.signInOutsider();
    const stored = await server.db('session').where({ user_id: client.user?.id }).first<{ id: string }>('id');
    const answer = await request(server.app)
      .get('/api/v1/me')
      .set('Cookie', `layerwell_session=${stored.id}`);
    expect(answer.status).toBe(401);
  });

  test('is refused to a switched-off account, also in the middle of a session', async () => {
    const client = await server.signInOutsider();
    expect((await client.get('/me')).status).toBe(200);
    await server.db('app_user').where({ id: client.user?.id }).update({ disabled_at: new Date() });
    expect((await client.get('/me')).status).toBe(401);
    const answer = await signIn(client.user?.email ?? '', TEST_PASSWORD);
    expect(answer.status).toBe(403);
    expect(answer.headers['set-cookie']).toBeUndefined();
  });

  test('ends the session that the browser had before', async () => {
    const before = await server.signInOutsider();
    const user = await server.createUser();
    await before.post('/session', { email: user.email, password: TEST_PASSWORD });
    expect((await before.get('/me')).status).toBe(401);
  });
});

describe('limits of signing in', () => {
  const resetCounts = () => server.db('sign_in_attempt').delete();

  test('one address may try one account ten times, then waits; its owner is not locked out', async () => {
    await resetCounts();
    const user = await server.createUser();
    for (let i = 0; i < 10; i += 1) expect((await signIn(user.email, `guess ${i}`)).status).toBe(401);
    const refused = await signIn(user.email, TEST_PASSWORD);
    expect(refused.status).toBe(429);
    const wait = Number(refused.headers['retry-after']);
    expect(wait).toBeGreaterThan(800);
    expect(wait).toBeLessThanOrEqual(900);
    await server.db('sign_in_attempt').where('key', 'like', '% from %').delete();
    await server.db('sign_in_attempt').where('key', 'like', 'address %').delete();
    // as from the owner's own address: what the account as a whole has left is enough
    expect((await signIn(user.email, TEST_PASSWORD)).status).toBe(200);
  });

  test('trying on while refused does not prolong the wait, and the window ends', async () => {
    await resetCounts();
    const user = await server.createUser();
    for (let i = 0; i < 11; i += 1) await signIn(user.email, 'a guess');
    const ends = () => server.db('sign_in_attempt').max<{ at: Date }[]>('window_ends_at as at').first();
    const before = await ends();
    await signIn(user.email, 'a guess');
    expect(await ends()).toEqual(before);
    await server
      .db('sign_in_attempt')
      .update({ window_ends_at: server.db.raw("now() - interval '1 second'") });
    expect((await signIn(user.email, TEST_PASSWORD)).status).toBe(200);
  });

  test('many at once do not slip through', async () => {
    await resetCounts();
    const user = await server.createUser();
    const answers = await Promise.all(
      Array.from({ length: 16 }, (_, i) => signIn(user.email, `guess ${i}`).then((answer) => answer.status)),
    );
    expect(answers.filter((status) => status === 401)).toHaveLength(10);
    expect(answers.filter((status) => status === 429)).toHaveLength(6);
  });

  test('good sign-ins use nothing up', async () => {
    await resetCounts();
    const user = await server.createUser();
    for (let i = 0; i < 12; i += 1) expect((await signIn(user.email, TEST_PASSWORD)).status).toBe(200);
  });

  test('one address may fail thirty times over all accounts', async () => {
    await resetCounts();
    for (let i = 0; i < 30; i += 1)
      expect((await signIn(`person${i}@example.test`, 'a guess')).status).toBe(401);
    expect((await signIn('person30@example.test', 'a guess')).status).toBe(429);
    await resetCounts();
  });
});

describe('sessions', () => {
  test('are listed without their secrets, the own one marked', async () => {
    const here = await server.signInOutsider();
    if (here.user) await server.signIn(here.user);
    const answer = await here.get('/sessions');
    const { items } = sessionListSchema.parse(answer.body);
    expect(items).toHaveLength(2);
    expect(items.filter((item) => item.current)).toHaveLength(1);
    const ids = await server.db('session').where({ user_id: here.user?.id }).pluck<string[]>('id');
    for (const id of ids) expect(JSON.stringify(answer.body)).not.toContain(id);
  });

  test('end here', async () => {
    const user = await server.createUser();
    const [here, there] = [await server.signIn(user), await server.signIn(user)];
    const answer = await here.delete('/session');
    expect(answer.status).toBe(204);
    expect(setCookie(answer.headers as Record<string, unknown>)).toMatch(/^layerwell_session=;.*Max-Age=0/);
    expect((await here.get('/me')).status).toBe(401);
    expect((await there.get('/me')).status).toBe(200);
  });

  test('end everywhere, for this person alone', async () => {
    const user = await server.createUser();
    const [here, there] = [await server.signIn(user), await server.signIn(user)];
    const other = await server.signInOutsider();
    expect((await here.delete('/sessions')).status).toBe(204);
    expect([(await here.get('/me')).status, (await there.get('/me')).status]).toEqual([401, 401]);
    expect((await other.get('/me')).status).toBe(200);
  });

  test('expire, and are prolonged while they are used', async () => {
    const client = await server.signInOutsider();
    const own = () => server.db('session').where({ user_id: client.user?.id });
    await own().update({ expires_at: server.db.raw("now() + interval '1 day'") });
    const prolonged = await client.get('/me');
    expect(setCookie(prolonged.headers as Record<string, unknown>)).toMatch(/^layerwell_session=[\w-]{43};/);
    await own().update({ expires_at: server.db.raw("now() - interval '1 second'") });
    expect((await client.get('/me')).status).toBe(401);
  });
});

test('a name is changed', async () => {
  const client = await server.signInOutsider();
  expect((await client.patch('/me', { name: '  ' })).status).toBe(422);
  expect((await client.patch('/me', { name: 'New Name' })).body).toMatchObject({ name: 'New Name' });
  expect((await client.get('/me')).body).toMatchObject({ name: 'New Name' });
});

describe('changing the password', () => {
  const newPassword = 'another good password';

  test('needs the current one and a long enough new one', async () => {
    const client = await server.signInOutsider();
    const short = await client.put('/me/password', { currentPassword: TEST_PASSWORD, newPassword: 'short' });
    expect(short.status).toBe(422);
    const wrong = await client.put('/me/password', { currentPassword: 'a guess', newPassword });
    expect(wrong.status).toBe(422);
    expect(wrong.body).toMatchObject({ faults: [{ path: ['body', 'currentPassword'] }] });
  });

  test('ends every other session and withdraws reset links', async () => {
    const user = await server.createUser();
    const [here, there] = [await server.signIn(user), await server.signIn(user)];
    const expires_at = server.db.raw("now() + interval '1 hour'");
    await server.db('password_reset').insert({ user_id: user.id, token_hash: user.id, expires_at });
    const answer = await here.put('/me/password', { currentPassword: TEST_PASSWORD, newPassword });
    expect(answer.status).toBe(204);
    expect([(await here.get('/me')).status, (await there.get('/me')).status]).toEqual([200, 401]);
    expect((await signIn(user.email, TEST_PASSWORD)).status).toBe(401);
    expect((await signIn(user.email, newPassword)).status).toBe(200);
    expect(await server.db('password_reset').where({ user_id: user.id, used_at: null })).toEqual([]);
  });

  test('does not let a found browser guess without end', async () => {
    const client = await server.signInOutsider();
    const guess = () => client.put('/me/password', { currentPassword: 'a guess', newPassword });
    for (let i = 0; i < 10; i += 1) expect((await guess()).status).toBe(422);
    expect((await guess()).status).toBe(429);
  });
});
