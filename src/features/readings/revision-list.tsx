import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { API_ROOT } from '../../api/http';
import { revisionListQuery } from '../../api/sounding-queries';
import { QueryView } from '../../app/query-view';
import { Badge } from '../../ui/badge';
import { formatCount, formatMoment } from '../../ui/format';
import { RevisionDialog } from './revision-dialog';
import type { Sheet } from './use-sheet';

/** Every saved state of the readings, newest first; any of them can be read and brought back. */
export function RevisionList({ sounding, sheet }: { sounding: Sounding; sheet: Sheet }) {
  const revisions = useQuery(revisionListQuery(sounding.id));
  const [search, setSearch] = useSearchParams();
  const opened = search.get('revision');
  const open = (revisionId: string | null) =>
    setSearch(
      (before) => {
        const next = new URLSearchParams(before);
        if (revisionId === null) next.delete('revision');
        else next.set('revision', revisionId);
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  return (
    <section aria-label="Revisions">
      <h2 className="mb-2 font-semibold">Revisions</h2>
      <QueryView query={revisions} loadingLabel="Loading revisions" loadingLines={3}>
        {({ items }) =>
          items.length === 0 ? (
            <p className="text-muted">None yet. Saving the sheet or reading in a file makes the first.</p>
          ) : (
            <ol className="border-t border-rule">
              {items.map((revision) => (
                <li
                  key={revision.id}
                  className="flex flex-wrap items-baseline gap-x-3 border-b border-rule py-2"
                >
                  <button
                    type="button"
                    onClick={() => open(revision.id)}
                    className="min-h-6 font-semibold underline decoration-rule underline-offset-2 hover:decoration-ink touch:min-h-11"
                  >
                    Revision {revision.number}
                  </button>
                  {revision.current ? <Badge tone="water">current</Badge> : null}
                  <span className="text-muted">
                    {revision.author.name}, {formatMoment(revision.createdAt)}
                  </span>
                  <span className="figure ml-auto text-sm text-muted" title={revision.contentHash}>
                    {revision.contentHash.slice(0, 8)}
                  </span>
                  <span className="w-full text-sm text-muted">
                    {formatCount(revision.readings, 'reading')}
                    {revision.excluded > 0 ? `, ${revision.excluded} left out with a reason` : ''}
                    {revision.sourceFile ? (
                      <>
                        , from{' '}
                        <a href={`${API_ROOT}/revisions/${revision.id}/source-file`} download>
                          {revision.sourceFile.name}
                        </a>
                        {revision.linesLeftOut > 0
                          ? `; ${formatCount(revision.linesLeftOut, 'line')} of it left out at import`
                          : ''}
                      </>
                    ) : null}
                  </span>
                </li>
              ))}
            </ol>
          )
        }
      </QueryView>
      {opened ? (
        <RevisionDialog revisionId={opened} sounding={sounding} sheet={sheet} onClose={() => open(null)} />
      ) : null}
    </section>
  );
}
