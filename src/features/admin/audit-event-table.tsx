import { useQuery } from '@tanstack/react-query';
import { Fragment } from 'react';
import { QueryView } from '../../app/query-view';
import { formatMoment } from '../../ui/format';
import { Pager } from '../../ui/pager';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { auditEventsQuery } from './admin-queries';
import { detailsInWords } from './details-in-words';
import { usePageParam } from './use-page-param';

/** What was done and by whom, newest first; events are never changed or removed. */
export function AuditEventTable() {
  const [page, setPage] = usePageParam();
  const events = useQuery(auditEventsQuery(page));
  return (
    <QueryView query={events} loadingLabel="Loading audit events">
      {({ items, total, pageSize }) =>
        items.length === 0 ? (
          <p className="text-muted">No event yet.</p>
        ) : (
          <>
            <Table caption="Audit events">
              <TableHead>
                <HeaderCell>When</HeaderCell>
                <HeaderCell>Who</HeaderCell>
                <HeaderCell>What</HeaderCell>
                <HeaderCell className="hidden sm:table-cell">On</HeaderCell>
                <HeaderCell className="hidden md:table-cell">Details</HeaderCell>
              </TableHead>
              <TableBody>
                {items.map((event) => (
                  <TableRow key={event.id}>
                    <Cell className="figure whitespace-nowrap">{formatMoment(event.at)}</Cell>
                    <Cell className="whitespace-nowrap">{event.actorName ?? 'the system'}</Cell>
                    <Cell className="wrap-anywhere sm:whitespace-nowrap">
                      <ActionName action={event.action} />
                      <span className="block text-muted sm:hidden">{event.subject}</span>
                    </Cell>
                    <Cell className="hidden min-w-48 wrap-anywhere sm:table-cell">{event.subject}</Cell>
                    <Cell className="hidden min-w-64 wrap-anywhere text-muted md:table-cell">
                      {detailsInWords(event.details)}
                    </Cell>
                  </TableRow>
                ))}
              </TableBody>
            </Table>
            <Pager page={page} pageSize={pageSize} total={total} what="event" onPage={setPage} />
          </>
        )
      }
    </QueryView>
  );
}

/** As "sounding.created"; a narrow place breaks it at the dot, not within a word. */
const ActionName = ({ action }: { action: string }) => (
  <span className="figure">
    {action.split('.').map((word, place) => (
      <Fragment key={word}>
        {place > 0 ? (
          <>
            <wbr />.
          </>
        ) : null}
        {word}
      </Fragment>
    ))}
  </span>
);
