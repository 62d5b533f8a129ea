import type { FieldSheet } from '../../../server/contract/readings';
import { formatMoment } from '../../ui/format';
import { Notice } from '../../ui/notice';
import type { Sheet } from './use-sheet';

interface SheetNoticesProps {
  fieldSheet: FieldSheet;
  sheet: Sheet;
  readOnly: boolean;
}

/** What a person should know before writing on: where the rows come from, and whether someone saved meanwhile. */
export function SheetNotices({ fieldSheet, sheet, readOnly }: SheetNoticesProps) {
  const { revision } = fieldSheet;
  if (readOnly)
    return <Notice>Your role reads this sheet. A lead or a geophysicist of the survey writes on it.</Notice>;
  const isBehind = revision !== null && revision.id !== sheet.baseRevisionId;
  return (
    <>
      {isBehind && sheet.isChanged ? (
        <Notice tone="caution" title={`Revision ${revision.number} was saved meanwhile`}>
          By {revision.author.name}, {formatMoment(revision.createdAt)}. Your rows stay as they are; when you
          save, both versions are shown and you choose.
        </Notice>
      ) : null}
      {sheet.origin === 'unsent' && sheet.isChanged ? (
        <Notice>
          These rows were kept on this device and had not reached the server. They are sent as you go on.
        </Notice>
      ) : null}
    </>
  );
}
