import { expect, it } from 'vitest';
import { tableToCsv } from '../../../../src/charts/chart-table';
import { modelJson, modelTable } from '../../../../src/features/bench/model-file';

const earth = { resistivity: [138.25, 11.5], thickness: [2.894] };

it('writes a bed a row, the half-space without a base', () => {
  const lines = tableToCsv(modelTable(earth, null)).split('\r\n');
  expect(lines[0]).toContain('Base (m)');
  expect(lines.slice(1, 3)).toEqual(['1,0,2.894,2.894,,,138.25,,', '2,2.894,,,,,11.5,,']);
});

it('says in its file that a model by hand is of no run', () => {
  expect(JSON.parse(modelJson({ soundingName: 'S-07', earth, run: null }))).toEqual({
    sounding: 'S-07',
    units: { resistivity: 'ohm m', thickness: 'm' },
    earth,
    run: null,
  });
});
