import { describe, expect, it } from 'vitest';
import type { SheetRow } from '../../../../server/contract/readings';
import { isBlock, readPasted } from '../../../../src/features/readings/paste-text';
import { sheetReducer, startHistory } from '../../../../src/features/readings/sheet-history';
import {
  blankRow,
  insertRow,
  MOST_ROWS,
  padRows,
  pasteBlock,
  removeRow,
  setRow,
  trimRows,
  withCell,
  withExcluded,
} from '../../../../src/features/readings/sheet-rows';
import { DEFAULT_SHEET_UNITS } from '../../../../server/contract/readings';

const row = (halfAB: string): SheetRow => ({ cells: { halfAB }, excluded: null });
const columns = ['halfAB', 'halfMN', 'voltage', 'excluded', 'remark'] as const;

describe('rows of a sheet', () => {
  it('always end with an empty one to write in, and are sent without the empty end', () => {
    const full = Array.from({ length: 8 }, (_, i) => row(String(i + 1)));
    expect(padRows(full)).toHaveLength(9);
    expect(padRows([])).toHaveLength(8);
    expect(trimRows(padRows(full))).toEqual(full);
    expect(trimRows([row('1'), blankRow(), row('3'), blankRow()])).toHaveLength(3);
  });

  it('keep a row whose only mark is that it is left out', () => {
    expect(trimRows([withExcluded(blankRow(), ''), blankRow()])).toHaveLength(1);
  });

  it('are changed, put in and taken out without touching the others', () => {
    const rows = [row('1'), row('2')];
    const changed = setRow(rows, 1, withCell(row('2'), 'halfAB', '2.5'));
    expect(changed[0]).toBe(rows[0]);
    expect(changed[1]?.cells.halfAB).toBe('2.5');
    expect(insertRow(rows, 1).map((r) => r.cells.halfAB)).toEqual(['1', undefined, '2', ...Array(5)]);
    expect(removeRow(rows, 0)[0]?.cells.halfAB).toBe('2');
  });

  it('have no cell for an emptied text', () => {
    expect(withCell(row('1'), 'halfAB', '').cells).toEqual({});
  });

  it('take a pasted block from the cell on, growing as needed', () => {
    const rows = pasteBlock(
      [row('1')],
      { row: 0, column: 'halfMN' },
      [
        ['0.5', '213', '', 'wet'],
        ['0,5', '96.5', 'cable', ''],
      ],
      columns,
    );
    expect(rows[0]).toEqual({
      cells: { halfAB: '1', halfMN: '0.5', voltage: '213', remark: 'wet' },
      excluded: null,
    });
    expect(rows[1]).toEqual({ cells: { halfMN: '0,5', voltage: '96.5' }, excluded: 'cable' });
  });

  it('do not grow past what the server takes', () => {
    const block = Array.from({ length: MOST_ROWS + 10 }, () => ['1']);
    expect(pasteBlock([], { row: 0, column: 'halfAB' }, block, columns)).toHaveLength(MOST_ROWS);
  });
});

describe('pasted text', () => {
  it('is a block when it fills more than one cell', () => {
    expect(isBlock('1\t2')).toBe(true);
    expect(isBlock('1\n2')).toBe(true);
    expect(isBlock('1,5')).toBe(false);
    expect(isBlock('1.5\r\n')).toBe(false);
  });

  it.each([
    [
      'tabs',
      '1.5\t0.25\r\n2\t0.25\r\n',
      [
        ['1.5', '0.25'],
        ['2', '0.25'],
      ],
    ],
    [
      'tabs and decimal commas',
      '1,5\t0,25\n2,0\t0,25',
      [
        ['1,5', '0,25'],
        ['2,0', '0,25'],
      ],
    ],
    ['one column with decimal commas', '1,5\n2,7', [['1,5'], ['2,7']]],
    [
      'semicolons and decimal commas',
      '1,5;0,25\n2;0,25',
      [
        ['1,5', '0,25'],
        ['2', '0,25'],
      ],
    ],
    [
      'commas beside points',
      '1.5,0.25\n2.7,0.25',
      [
        ['1.5', '0.25'],
        ['2.7', '0.25'],
      ],
    ],
    [
      'several commas to a line',
      '1,2,3\n4,5,6',
      [
        ['1', '2', '3'],
        ['4', '5', '6'],
      ],
    ],
    ['a quoted remark', '1.5\t"wet, ""very"" wet"', [['1.5', 'wet, "very" wet']]],
  ])('with %s', (_, text, rows) => {
    expect(readPasted(text)).toEqual({ rows, headingLeftOut: false });
  });

  it('leaves a heading line out, and says so', () => {
    expect(readPasted('AB/2\tV\n1.5\t213')).toEqual({ rows: [['1.5', '213']], headingLeftOut: true });
  });
});

describe('undo', () => {
  const content = (text: string) => ({ rows: [row(text)], units: DEFAULT_SHEET_UNITS });
  const textOf = (history: ReturnType<typeof startHistory>) => history.present.rows[0]?.cells.halfAB;

  it('takes back keystrokes of one cell together, other edits one by one', () => {
    let history = startHistory(content(''));
    for (const text of ['1', '12', '125'])
      history = sheetReducer(history, { type: 'edit', content: content(text), mark: '0 halfAB' });
    history = sheetReducer(history, { type: 'edit', content: content('9'), mark: '1 halfAB' });
    history = sheetReducer(history, { type: 'undo' });
    expect(textOf(history)).toBe('125');
    history = sheetReducer(history, { type: 'undo' });
    expect(textOf(history)).toBe('');
    expect(sheetReducer(history, { type: 'undo' })).toBe(history);
  });

  it('is taken back by redo, until something new is written', () => {
    let history = startHistory(content('a'));
    history = sheetReducer(history, { type: 'edit', content: content('b') });
    history = sheetReducer(history, { type: 'undo' });
    expect(textOf(sheetReducer(history, { type: 'redo' }))).toBe('b');
    history = sheetReducer(history, { type: 'edit', content: content('c') });
    expect(sheetReducer(history, { type: 'redo' })).toBe(history);
  });
});
