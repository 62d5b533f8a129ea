import { expect, test } from 'vitest';
import { cellText, fileNameOf, tableToCsv } from '../../../src/charts/chart-table';

test('CSV: units in the head, quotes doubled, numbers with a point, gaps empty', () => {
  const table = {
    columns: [{ label: 'AB/2', unit: 'm' }, { label: 'Note, in words' }, { label: 'Value' }],
    rows: [
      [1.5, 'said "wet", left out', null],
      [0.1 + 0.2, 'plain', 12345.678],
    ],
  };
  expect(tableToCsv(table)).toBe(
    'AB/2 (m),"Note, in words",Value\r\n1.5,"said ""wet"", left out",\r\n0.3,plain,12345.678\r\n',
  );
});

test('a text that a spreadsheet would run stays a text', () => {
  expect(tableToCsv({ columns: [{ label: 'Note' }], rows: [['=1+1'], ['@x'], [-2]] })).toBe(
    "Note\r\n'=1+1\r\n'@x\r\n-2\r\n",
  );
});

test('cells are shown as their column says', () => {
  const column = { label: 'Depth', format: (value: number) => value.toFixed(1) };
  expect(cellText(2.25, column)).toBe('2.3');
  expect(cellText(null, column)).toBe('');
  expect(cellText('yes', column)).toBe('yes');
});

test.each([
  ['Apparent resistivity, S-07', 'apparent-resistivity-s-07'],
  ['Bære / 2', 'b-re-2'],
  ['Époque', 'epoque'],
  ['Ωδη', 'layerwell'],
])('%s → %s', (title, name) => expect(fileNameOf(title)).toBe(name));
