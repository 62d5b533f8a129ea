import { idSchema } from '../../../server/contract/common';
import { soundingQuerySchema, soundingStateSchema } from '../../../server/contract/soundings';
import { spreadTypeSchema } from '../../../server/contract/spread';
import type { SoundingListFilter } from '../../api/sounding-queries';

export const PAGE_SIZE = 100;

export type SortKey = NonNullable<SoundingListFilter['sort']>;

export interface SoundingListParams {
  search: string;
  lineId?: string;
  state?: NonNullable<SoundingListFilter['state']>;
  spreadType?: NonNullable<SoundingListFilter['spreadType']>;
  sort: SortKey;
  order: 'asc' | 'desc';
  page: number;
}

const sortSchema = soundingQuerySchema.shape.sort.unwrap();

/** What an address says of the table; parts that say nothing sensible are as if absent. */
export function readListParams(search: URLSearchParams): SoundingListParams {
  const lineId = idSchema.safeParse(search.get('line')).data;
  const state = soundingStateSchema.safeParse(search.get('state')).data;
  const spreadType = spreadTypeSchema.safeParse(search.get('spread')).data;
  const page = Number(search.get('page') ?? 1);
  return {
    search: search.get('search') ?? '',
    ...(lineId ? { lineId } : {}),
    ...(state ? { state } : {}),
    ...(spreadType ? { spreadType } : {}),
    sort: sortSchema.safeParse(search.get('sort')).data ?? 'name',
    order: search.get('order') === 'desc' ? 'desc' : 'asc',
    page: Number.isInteger(page) && page > 0 ? page : 1,
  };
}

/** The address for these choices; the usual ones are left out, so that a plain table has a plain address. */
export function writeListParams(params: SoundingListParams): URLSearchParams {
  const search = new URLSearchParams();
  if (params.search !== '') search.set('search', params.search);
  if (params.lineId) search.set('line', params.lineId);
  if (params.state) search.set('state', params.state);
  if (params.spreadType) search.set('spread', params.spreadType);
  if (params.sort !== 'name') search.set('sort', params.sort);
  if (params.order !== 'asc') search.set('order', params.order);
  if (params.page > 1) search.set('page', String(params.page));
  return search;
}

export const isFiltered = (params: SoundingListParams): boolean =>
  params.search !== '' ||
  params.lineId !== undefined ||
  params.state !== undefined ||
  params.spreadType !== undefined;

/** Sorting by the column that is sorted already turns it round. */
export const sortedBy = (params: SoundingListParams, sort: SortKey): SoundingListParams => ({
  ...params,
  sort,
  order: params.sort === sort && params.order === 'asc' ? 'desc' : 'asc',
  page: 1,
});
