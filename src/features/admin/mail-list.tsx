import { useQuery } from '@tanstack/react-query';
import { QueryView } from '../../app/query-view';
import { formatMoment } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { Pager } from '../../ui/pager';
import { mailQuery } from './admin-queries';
import { linkedText } from './linked-text';
import { usePageParam } from './use-page-param';

/** Letters that this installation kept for itself, because no mail server is set. */
export function MailList() {
  const [page, setPage] = usePageParam();
  const mail = useQuery(mailQuery(page));
  return (
    <QueryView query={mail} loadingLabel="Loading mail">
      {({ items, total, pageSize, sink }) => (
        <div className="flex max-w-4xl flex-col gap-4">
          <Notice tone={sink ? 'caution' : 'note'}>
            {sink
              ? 'No mail server is set: letters do not leave this installation and are kept here. Set MAIL_URL to send them.'
              : 'Letters go out by the mail server of MAIL_URL; only those kept before are shown.'}
          </Notice>
          {items.length === 0 ? (
            <p className="text-muted">No letter yet.</p>
          ) : (
            <>
              <ul className="border-t border-rule">
                {items.map((letter) => (
                  <li key={letter.id} className="border-b border-rule">
                    <details>
                      <summary className="flex min-h-9 flex-wrap items-baseline gap-x-4 py-1.5 touch:min-h-11">
                        <span className="font-semibold">{letter.subject}</span>
                        <span className="text-muted">to {letter.recipients.join(', ')}</span>
                        <span className="figure ml-auto text-sm text-muted">
                          {formatMoment(letter.receivedAt)}
                        </span>
                      </summary>
                      <div className="border-l-2 border-rule py-2 pl-4">
                        <p className="mb-2 text-sm text-muted">From {letter.sender}</p>
                        <p className="max-w-prose wrap-anywhere whitespace-pre-wrap">
                          {linkedText(letter.text)}
                        </p>
                      </div>
                    </details>
                  </li>
                ))}
              </ul>
              <Pager page={page} pageSize={pageSize} total={total} what="letter" onPage={setPage} />
            </>
          )}
        </div>
      )}
    </QueryView>
  );
}
