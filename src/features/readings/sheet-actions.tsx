import { useState } from 'react';
import { revisionSchema, type FieldSheet, type Revision } from '../../../server/contract/readings';
import type { Sounding } from '../../../server/contract/soundings';
import { currentOf, hasCode } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { SPREAD_LABELS } from '../../soundings/spread-words';
import { Button, ButtonLink } from '../../ui/button';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { formatDay } from '../../ui/format';
import { FormErrors } from '../../ui/form-errors';
import { Notice } from '../../ui/notice';
import { PageHeader } from '../../ui/page-header';
import { showToast } from '../../ui/show-toast';
import type { DraftKeeper } from './draft-keeper';
import { ImportDialog } from './import-dialog';
import { useDiscardDraft, useSaveRevision } from './reading-mutations';
import { saveOutcome } from './save-outcome';
import { padRows } from './sheet-rows';
import { SheetConflictDialog } from './sheet-conflict-dialog';
import { SoundingDetailsDialog } from './sounding-details-dialog';
import { contentOfRevision } from './start-sheet';
import type { Sheet } from './use-sheet';

interface SheetActionsProps {
  sounding: Sounding;
  fieldSheet: FieldSheet;
  sheet: Sheet;
  keeper: DraftKeeper;
}

type OpenDialog = 'import' | 'details' | 'discard' | null;

/** The head of the Field sheet: saving, reading in a file, the sounding's details. */
export function SheetActions({ sounding, fieldSheet, sheet, keeper }: SheetActionsProps) {
  const [open, setOpen] = useState<OpenDialog>(null);
  const [imported, setImported] = useState<string | null>(null);
  const [theirs, setTheirs] = useState<Revision | null>(null);
  const save = useSaveRevision(sounding.id);
  const discard = useDiscardDraft(sounding.id);
  const { faults, readings } = sheet.sheet;
  const { content } = sheet;

  const saveOver = async (baseRevisionId: string | null) => {
    const settled = await keeper.settle();
    save.mutate(
      { ...sheet.draft, baseRevisionId },
      {
        onSuccess: (outcome) => {
          keeper.saved(settled, outcome.revision.id);
          sheet.markSaved(outcome.revision.id, content);
          setTheirs(null);
          showToast({ title: saveOutcome(outcome), kind: 'good' });
        },
        onError: (error) => {
          keeper.resume();
          setTheirs(currentOf(error, revisionSchema));
        },
      },
    );
  };
  const show = (revision: Revision | null) => {
    const next = revision ? contentOfRevision(revision) : { ...content, rows: padRows([]) };
    sheet.replace(next, revision?.id ?? null);
    sheet.markSaved(revision?.id ?? null, next);
    keeper.discard();
  };
  const throwAway = async () => {
    await keeper.settle();
    discard.mutate(undefined, {
      onSuccess: () => show(fieldSheet.revision),
      onSettled: () => setOpen(null),
    });
  };
  const fault = save.error ?? discard.error;
  return (
    <div>
      <PageHeader
        title={sounding.name}
        note={headline(sounding)}
        actions={
          <>
            {fieldSheet.revision ? (
              <ButtonLink kind="quiet" to={addressOf('bench', { soundingId: sounding.id })}>
                To the Bench
              </ButtonLink>
            ) : null}
            <Button kind="quiet" onClick={() => setOpen('details')}>
              Details
            </Button>
            {sounding.can.editReadings ? (
              <>
                <Button onClick={() => setOpen('import')}>Read in a file</Button>
                {sheet.isChanged ? (
                  <Button kind="quiet" onClick={() => setOpen('discard')}>
                    Discard the draft
                  </Button>
                ) : null}
                <Button
                  kind="main"
                  loading={save.isPending}
                  disabled={faults.length > 0 || readings.length === 0 || !sheet.isChanged}
                  onClick={() => void saveOver(sheet.baseRevisionId)}
                >
                  Save the readings
                </Button>
              </>
            ) : null}
          </>
        }
      />
      {imported !== null && !sheet.isChanged ? (
        <Notice>
          <output>{imported}</output>
        </Notice>
      ) : null}
      <FormErrors faults={hasCode(fault, 'conflict') && theirs ? [] : formFaults(fault)} />
      {open === 'details' ? (
        <SoundingDetailsDialog sounding={sounding} onClose={() => setOpen(null)} />
      ) : null}
      {open === 'import' ? (
        <ImportDialog
          sounding={sounding}
          hasDraft={sheet.isChanged}
          current={fieldSheet.revision}
          onImported={(revision, outcome) => {
            show(revision);
            setImported(outcome);
          }}
          onClose={() => setOpen(null)}
        />
      ) : null}
      <ConfirmDialog
        open={open === 'discard'}
        onOpenChange={(next) => setOpen(next ? 'discard' : null)}
        title="Discard the draft?"
        description={
          fieldSheet.revision
            ? `The sheet goes back to revision ${fieldSheet.revision.number}. While this page is open, undo brings the draft back.`
            : 'The sheet becomes empty. While this page is open, undo brings the draft back.'
        }
        confirmLabel="Discard the draft"
        danger
        working={discard.isPending}
        onConfirm={() => void throwAway()}
      />
      {theirs ? (
        <SheetConflictDialog
          sheet={sheet}
          theirs={theirs}
          working={save.isPending}
          onSaveMine={() => void saveOver(theirs.id)}
          onTakeTheirs={() => {
            show(theirs);
            setTheirs(null);
            discard.mutate();
          }}
          onClose={() => setTheirs(null)}
        />
      ) : null}
    </div>
  );
}

const headline = (sounding: Sounding): string =>
  [
    SPREAD_LABELS[sounding.spreadType],
    ...(sounding.measuredOn ? [formatDay(sounding.measuredOn)] : []),
    ...(sounding.crew === '' ? [] : [sounding.crew]),
    ...(sounding.instrument === '' ? [] : [sounding.instrument]),
  ].join(' · ');
