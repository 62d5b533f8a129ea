import { describe, expect, it } from 'vitest';
import { checkSpread, type Spread } from '../../../inversion';

describe('checkSpread', () => {
  it.each<Spread>([
    { type: 'schlumberger', halfAB: 10, halfMN: 9.99 },
    { type: 'half-schlumberger', halfAB: 10, halfMN: null },
    { type: 'dipole-dipole', dipole: 1, n: 1000 },
    { type: 'electrodes', am: null, an: 3, bm: null, bn: null },
    { type: 'schlumberger', halfAB: 5000, halfMN: 0.1 },
  ])('takes %j', (spread) => {
    expect(checkSpread(spread)).toBeNull();
  });

  it.each<[Spread, string, string]>([
    [{ type: 'wenner', spacing: 0 }, 'spread-length', 'spacing'],
    [{ type: 'wenner', spacing: Number.NaN }, 'spread-length', 'spacing'],
    [{ type: 'dipole-dipole', dipole: 5, n: -1 }, 'spread-length', 'n'],
    [{ type: 'schlumberger', halfAB: 10, halfMN: 10 }, 'spread-halfmn', 'halfMN'],
    [{ type: 'half-schlumberger', halfAB: 10, halfMN: 12 }, 'spread-halfmn', 'halfMN'],
    [{ type: 'electrodes', am: 1, an: 1, bm: 2, bn: 2 }, 'spread-cancels', 'am'],
    [{ type: 'electrodes', am: 1, an: 1 + 1e-10, bm: 2, bn: 2 }, 'spread-cancels', 'am'],
    [{ type: 'electrodes', am: null, an: null, bm: null, bn: null }, 'spread-cancels', 'am'],
  ])('refuses %j', (spread, code, field) => {
    expect(checkSpread(spread)).toMatchObject({ code, field });
  });

  it('says what was found and what is allowed', () => {
    expect(checkSpread({ type: 'wenner', spacing: -5 })?.message).toBe(
      'spacing is -5; it must be a number above 0',
    );
    expect(checkSpread({ type: 'electrodes', am: 0, an: null, bm: 1, bn: 1 })?.message).toBe(
      'am is 0; it must be a number above 0 or null',
    );
  });
});
