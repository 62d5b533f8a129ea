import { formatSheetRow } from '../../../server/contract/field-sheet';
import {
  DEFAULT_SHEET_UNITS,
  type FieldSheet,
  type Revision,
  type SheetUnits,
} from '../../../server/contract/readings';
import type { LocalDraft } from './draft-keeper';
import type { SheetContent } from './sheet-history';
import { padRows } from './sheet-rows';

export type SheetOrigin = 'unsent' | 'draft' | 'revision' | 'empty';

export interface StartSheet {
  content: SheetContent;
  baseRevisionId: string | null;
  origin: SheetOrigin;
}

export const contentOfRevision = (
  revision: Revision,
  units: SheetUnits = DEFAULT_SHEET_UNITS,
): SheetContent => ({
  rows: padRows(revision.readings.map((reading) => formatSheetRow(reading, units))),
  units,
});

/** What the sheet opens with: keystrokes that never reached the server, else the draft there, else the saved readings. */
export function startSheet(fieldSheet: FieldSheet, local: LocalDraft | null): StartSheet {
  const { draft, revision } = fieldSheet;
  const isNewer = local !== null && (draft === null || local.editedAt > draft.updatedAt);
  const chosen = isNewer ? local.draft : draft;
  if (chosen)
    return {
      content: { rows: padRows(chosen.rows), units: chosen.units },
      baseRevisionId: chosen.baseRevisionId,
      origin: isNewer ? 'unsent' : 'draft',
    };
  if (revision)
    return { content: contentOfRevision(revision), baseRevisionId: revision.id, origin: 'revision' };
  return {
    content: { rows: padRows([]), units: DEFAULT_SHEET_UNITS },
    baseRevisionId: null,
    origin: 'empty',
  };
}
