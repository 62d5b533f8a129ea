import { expect, test } from 'vitest';
import { may, ROLE_ACTIONS, surveyCan } from '../../../server/access/policy';
import { roleSchema, surveyCanSchema } from '../../../server/contract/roles';

test('only a hydrogeologist decides, and does not touch readings or runs', () => {
  expect(roleSchema.options.filter((role) => may(role, 'decide'))).toEqual(['hydrogeologist']);
  for (const action of ['editReadings', 'run', 'recompute', 'interpret', 'submit'] as const)
    expect(may('hydrogeologist', action)).toBe(false);
});

test('a guest does nothing but read', () => {
  expect(ROLE_ACTIONS.guest).toEqual([]);
});

test('an analyst proposes and reproduces, and neither submits nor changes readings', () => {
  expect(may('analyst', 'interpret')).toBe(true);
  expect(may('analyst', 'recompute')).toBe(true);
  for (const action of ['submit', 'editReadings', 'run', 'decide'] as const)
    expect(may('analyst', action)).toBe(false);
});

test('the can object names every right of the contract', () => {
  for (const role of roleSchema.options)
    expect(surveyCanSchema.parse(surveyCan(role))).toEqual(surveyCan(role));
});
