import { describe, expect, it } from 'vitest';
import type { Revision, RowFault } from '../../../../server/contract/readings';
import { leftOutHeading, leftOutWords } from '../../../../src/features/readings/left-out-lines';
import { importOutcome } from '../../../../src/features/readings/save-outcome';

const fault = (row: number, column: string, found: string, message: string): RowFault => ({
  row,
  column,
  found,
  message,
  allowed: '',
});
const saved = (readings: number, isNew = true) => ({
  isNew,
  revision: { number: 1, readings: Array.from({ length: readings }) } as unknown as Revision,
});

describe('lines left out at an import', () => {
  it('are counted with the name of their file', () => {
    expect(leftOutHeading(3, 'survey.csv')).toBe('3 lines of survey.csv were left out at import');
    expect(leftOutHeading(1, 'survey.csv')).toBe('1 line of survey.csv was left out at import');
  });

  it('are told with line, column, what was found and why', () => {
    expect(leftOutWords(fault(5, 'V (mV)', 'abc', 'is not a number'))).toBe(
      'Line 5, V (mV): “abc” is not a number',
    );
    expect(leftOutWords(fault(6, '', '', 'has 5 values where the headings name 4'))).toBe(
      'Line 6: has 5 values where the headings name 4',
    );
  });
});

describe('what an import came to', () => {
  it('names the revision, and says that nothing is left to save', () => {
    expect(importOutcome({ fileName: 'survey.csv', faults: [] }, saved(20))).toBe(
      '20 readings of survey.csv read in. Saved as revision 1. There is nothing left to save.',
    );
  });

  it('counts lines left out once, however many faults they have', () => {
    const faults = [fault(5, 'a', 'x', ''), fault(5, 'V', 'y', ''), fault(9, 'a', 'z', '')];
    expect(importOutcome({ fileName: 'survey.csv', faults }, saved(18))).toBe(
      '18 readings of survey.csv read in. Saved as revision 1. 2 lines with faults left out.',
    );
    expect(importOutcome({ fileName: 'survey.csv', faults }, saved(18, false))).toContain(
      'Same content as revision 1',
    );
  });
});
