import { Button } from './button';
import { formatFixed } from './format';

interface PagerProps {
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
  /** One of what is paged, as "sounding". */
  what: string;
}

const count = (value: number) => formatFixed(value, 0);

/** "24 soundings", or "101–200 of 2000 soundings" with the way back and on. */
export function Pager({ page, pageSize, total, onPage, what }: PagerProps) {
  const last = Math.max(1, Math.ceil(total / pageSize));
  const words = total === 1 ? what : `${what}s`;
  return (
    <nav aria-label={`Pages of ${what}s`} className="flex flex-wrap items-center justify-between gap-3 py-3">
      <p className="text-muted">
        {last > 1 ? (
          <>
            <span className="figure text-ink">
              {count((page - 1) * pageSize + 1)}–{count(Math.min(total, page * pageSize))}
            </span>{' '}
            of{' '}
          </>
        ) : null}
        <span className="figure text-ink">{count(total)}</span> {words}
      </p>
      {last > 1 ? (
        <div className="flex items-center gap-2">
          <Button size="small" disabled={page <= 1} onClick={() => onPage(page - 1)}>
            Previous
          </Button>
          <span className="figure text-muted">
            {page} / {last}
          </span>
          <Button size="small" disabled={page >= last} onClick={() => onPage(page + 1)}>
            Next
          </Button>
        </div>
      ) : null}
    </nav>
  );
}
