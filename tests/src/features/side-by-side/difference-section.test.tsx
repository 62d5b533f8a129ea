import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { DifferenceSection } from '../../../../src/features/side-by-side/difference-section';

type Props = Parameters<typeof DifferenceSection>[0];

const run = (number: number) => ({ number }) as Props['base'];
const drawn = (beds: Props['pair']['beds']) =>
  renderToStaticMarkup(
    <DifferenceSection
      base={run(1)}
      other={run(3)}
      pair={{ text: 'They fit alike.', beds } as Props['pair']}
    />,
  );

it('opens numbers only where there are any', () => {
  expect(drawn([])).toContain('They fit alike.');
  expect(drawn([])).not.toContain('Differences in numbers');
  const bed = { bed: 0, quantity: 'resistivity', unit: 'Ω·m', first: 80, second: 120, ratio: 1.5 } as const;
  const html = drawn([{ ...bed, isHeld: false, intervalsOverlap: false }]);
  expect(html).toContain('Differences in numbers');
  expect(html).toContain('C/A');
  expect(html).toContain('apart');
});
