import { expect, test } from 'vitest';
import { runLetter } from '../../../server/contract/run-letter';

test.each([
  [1, 'A'],
  [26, 'Z'],
  [27, 'AA'],
  [52, 'AZ'],
  [53, 'BA'],
  [702, 'ZZ'],
  [703, 'AAA'],
])('run %d is %s', (number, letter) => expect(runLetter(number)).toBe(letter));

test('runs are numbered from 1', () => expect(() => runLetter(0)).toThrow(RangeError));
