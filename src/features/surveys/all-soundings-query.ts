import { queryOptions } from '@tanstack/react-query';
import { soundingPageSchema, type SoundingRow } from '../../../server/contract/soundings';
import { getJson, queryText } from '../../api/http';
import { soundingKeys } from '../../api/sounding-queries';

const PAGE_SIZE = 500;
/** More marks than this cannot be told apart on a sketch. */
const MOST = 2000;

/** The soundings of a survey for its plan: page after page, up to a limit that is told with them. */
export const allSoundingsQuery = (surveyId: string) =>
  queryOptions({
    queryKey: [...soundingKeys.surveyLists(surveyId), 'plan'] as const,
    queryFn: async ({ signal }): Promise<{ items: SoundingRow[]; total: number }> => {
      const items: SoundingRow[] = [];
      for (let page = 1; ; page += 1) {
        const answer = await getJson(
          `/surveys/${surveyId}/soundings${queryText({ page, pageSize: PAGE_SIZE, sort: 'name' })}`,
          soundingPageSchema,
          { signal },
        );
        items.push(...answer.items);
        const isLast = answer.items.length < PAGE_SIZE;
        if (isLast || items.length >= MOST) return { items, total: answer.total };
      }
    },
  });
