import { renderToStaticMarkup } from 'react-dom/server';
import { MemoryRouter } from 'react-router-dom';
import { expect, it } from 'vitest';
import { ChecksNote } from '../../../../src/features/bench/checks-note';

type Props = Parameters<typeof ChecksNote>[0];
const check = {} as Props['revision']['checks'][number];

const drawn = (count: number, run: Props['run']) =>
  renderToStaticMarkup(
    <MemoryRouter>
      <ChecksNote revision={{ id: 'r2', soundingId: 's', checks: Array(count).fill(check) }} run={run} />
    </MemoryRouter>,
  );

it('leads from the Bench to what the Field sheet doubts in these readings', () => {
  expect(drawn(2, { revisionId: 'r2' })).toContain('found 2 things to doubt in these readings.');
  expect(drawn(1, null)).toContain('found 1 thing to doubt');
  expect(drawn(1, null)).toContain('href="/soundings/s/readings"');
});

it('says nothing without doubts, or beside a run of older readings', () => {
  expect(drawn(0, { revisionId: 'r2' })).toBe('');
  expect(drawn(2, { revisionId: 'r1' })).toBe('');
});
