import { expect, it } from 'vitest';
import { createForwardOperator, createRandomStream } from '../../../inversion';
import { randomEarth, randomSpread } from '../../../inversion/reference/random-cases';
import { median, relativeError } from '../support/relative-error';

it('the operator of the search is at a third of the nodes within 1e-5 at the median, and within 3 % at contrasts of 10⁴', () => {
  const random = createRandomStream(5);
  const errors = Array.from({ length: 60 }, () => {
    const spreads = Array.from({ length: 6 }, (_, turn) => randomSpread(random, turn));
    const operator = createForwardOperator(spreads);
    expect(operator.quick().nodes).toBeLessThan(operator.nodes / 3);
    const earth = randomEarth(random);
    const exact = operator.predict(earth);
    return Array.from(operator.quick().predict(earth), (value, i) => relativeError(value, exact[i]!));
  }).flat();
  expect(median(errors)).toBeLessThan(1e-5);
  expect(Math.max(...errors)).toBeLessThan(0.03);
});

it('is made once', () => {
  const operator = createForwardOperator([{ type: 'wenner', spacing: 3 }]);
  expect(operator.quick()).toBe(operator.quick());
});
