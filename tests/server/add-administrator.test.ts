import { expect, it } from 'vitest';
import { addAdministrator } from '../../server/admin/add-administrator';
import { createTestServer } from '../setup/server';

const server = await createTestServer();

it('gives a new administrator a link that sets the first password', async () => {
  const token = await addAdministrator(server.db, { email: 'first@layerwell.example', name: 'First Person' });
  const newPassword = 'a long enough password';
  expect((await server.nobody.put(`/password-resets/${token}`, { newPassword })).status).toBe(204);
  const answer = await server.nobody.post('/session', {
    email: 'first@layerwell.example',
    password: newPassword,
  });
  expect(answer.body).toMatchObject({ isAdmin: true, name: 'First Person' });
});

it('raises an account that is there already, and keeps its name', async () => {
  const user = await server.createUser();
  await addAdministrator(server.db, { email: user.email, name: 'Another Name' });
  const row = await server.db('app_user').where({ id: user.id }).first();
  expect(row).toMatchObject({ is_admin: true, name: user.name });
});
