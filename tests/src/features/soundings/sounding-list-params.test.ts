import { describe, expect, it } from 'vitest';
import {
  isFiltered,
  readListParams,
  sortedBy,
  writeListParams,
} from '../../../../src/features/soundings/sounding-list-params';

const line = '0b0e5a52-7f0b-4a53-9f63-0f6a1c0f9d11';

describe('the address of the soundings table', () => {
  it('holds every choice and gives it back', () => {
    const text = `search=S-0&line=${line}&state=fitted&spread=wenner&sort=misfit&order=desc&page=3`;
    const params = readListParams(new URLSearchParams(text));
    expect(params).toEqual({
      search: 'S-0',
      lineId: line,
      state: 'fitted',
      spreadType: 'wenner',
      sort: 'misfit',
      order: 'desc',
      page: 3,
    });
    expect(writeListParams(params).toString()).toBe(text);
    expect(isFiltered(params)).toBe(true);
  });

  it('is plain for a plain table, and nonsense counts as absent', () => {
    const plain = readListParams(new URLSearchParams('state=lost&line=7&page=-1&sort=colour&order=up'));
    expect(plain).toEqual({ search: '', sort: 'name', order: 'asc', page: 1 });
    expect(writeListParams(plain).toString()).toBe('');
    expect(isFiltered(plain)).toBe(false);
  });

  it('sorts a new column upwards, turns the same one round, and starts from the first page', () => {
    const params = readListParams(new URLSearchParams('page=4'));
    const once = sortedBy(params, 'misfit');
    expect(once).toMatchObject({ sort: 'misfit', order: 'asc', page: 1 });
    expect(sortedBy(once, 'misfit').order).toBe('desc');
    expect(sortedBy(sortedBy(once, 'misfit'), 'misfit').order).toBe('asc');
  });
});
