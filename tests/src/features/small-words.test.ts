import { expect, it } from 'vitest';
import { detailsInWords } from '../../../src/features/admin/details-in-words';
import { deviceName } from '../../../src/features/account/device-name';
import { latestWaterLevel } from '../../../src/boreholes/latest-water-level';

it.each([
  ['Mozilla/5.0 (X11; Linux x86_64; rv:130.0) Gecko/20100101 Firefox/130.0', 'Firefox on Linux'],
  [
    'Mozilla/5.0 (Linux; Android 14) AppleWebKit/537.36 Chrome/128.0 Mobile Safari/537.36',
    'Chrome on Android',
  ],
  [
    'Mozilla/5.0 (Windows NT 10.0) AppleWebKit/537.36 Chrome/128.0 Safari/537.36 Edg/128.0',
    'Edge on Windows',
  ],
  ['curl/8.5.0', 'curl/8.5.0'],
  ['', 'Unknown device'],
])('names the device of %s', (userAgent, name) => expect(deviceName(userAgent)).toBe(name));

it('tells the details of an event in words', () => {
  expect(detailsInWords({ role: 'guest', fields: ['name', 'note'], file: null })).toBe(
    'role guest; fields name, note',
  );
  expect(detailsInWords({ runId: '55b9ee2e-1e86-404e-a67f-aca37524c81a' })).toBe('run 55b9ee2e');
  expect(detailsInWords({ to: 'lead', from: 'guest' })).toBe('from guest; to lead');
  expect(detailsInWords({ newAccount: true })).toBe('new account yes');
});

it('takes the water level that was measured last, in whatever order they were written', () => {
  const level = (measuredOn: string, depthM: number) => ({ measuredOn, depthM });
  const waterLevels = [level('1998-09-20', 5.1), level('2026-05-18', 6.4), level('2011-06-05', 3.2)];
  expect(latestWaterLevel({ waterLevels })?.depthM).toBe(6.4);
  expect(latestWaterLevel({ waterLevels: [] })).toBeNull();
});
