import { useSearchParams } from 'react-router-dom';

/** The page of a paged list, kept in the address. */
export function usePageParam(): [page: number, setPage: (page: number) => void] {
  const [search, setSearch] = useSearchParams();
  const asked = Number(search.get('page') ?? 1);
  const page = Number.isInteger(asked) && asked > 0 ? asked : 1;
  const setPage = (next: number) =>
    setSearch((before) => {
      const after = new URLSearchParams(before);
      if (next > 1) after.set('page', String(next));
      else after.delete('page');
      return after;
    });
  return [page, setPage];
}
