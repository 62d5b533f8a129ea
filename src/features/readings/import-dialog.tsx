import { useState } from 'react';
import type { ImportMapping, ImportPreview, Revision } from '../../../server/contract/readings';
import type { Sounding } from '../../../server/contract/soundings';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { formatCount } from '../../ui/format';
import { FormErrors } from '../../ui/form-errors';
import { Notice } from '../../ui/notice';
import { Skeleton } from '../../ui/view-states';
import { FilePicker } from './file-picker';
import { ImportPreviewView } from './import-preview-view';
import { importReadiness } from './import-readiness';
import { useImport, usePreviewImport } from './reading-mutations';
import { importOutcome } from './save-outcome';

interface ImportDialogProps {
  sounding: Sounding;
  hasDraft: boolean;
  /** the revision that the sheet shows */
  current: Revision | null;
  /** the revision that was made of the file, and what came of it in a sentence */
  onImported: (revision: Revision, outcome: string) => void;
  onClose: () => void;
}

/** Reads in a file: shown first with every fault, stored only when a person says what to take. */
export function ImportDialog({ sounding, hasDraft, current, onImported, onClose }: ImportDialogProps) {
  const [file, setFile] = useState<File | null>(null);
  const [shown, setShown] = useState<ImportPreview | null>(null);
  const [unitsConfirmed, setUnitsConfirmed] = useState(false);
  const preview = usePreviewImport(sounding.id);
  const store = useImport(sounding.id);
  const look = (chosen: File, mapping: ImportMapping | null) => {
    setFile(chosen);
    store.reset();
    if (mapping === null) {
      setShown(null);
      setUnitsConfirmed(false);
    }
    preview.mutate({ file: chosen, mapping }, { onSuccess: setShown });
  };
  const take = (accept: 'all' | 'good-rows') => {
    if (!file || !shown) return;
    store.mutate(
      { file, mapping: shown.mapping, accept, baseRevisionId: current?.id ?? null },
      {
        onSuccess: (outcome) => {
          onImported(outcome.revision, importOutcome(shown, outcome));
          onClose();
        },
      },
    );
  };
  const ready = shown && !preview.isPending ? importReadiness(shown, unitsConfirmed) : null;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      width="wide"
      title="Read in a file"
      description="Text with one reading a line: CSV or any table saved as text. Nothing is stored before you choose below; what you import is saved as a revision at once."
      actions={
        <>
          <Button onClick={onClose}>Import nothing</Button>
          {shown && shown.faults.length > 0 ? (
            <Button loading={store.isPending} disabled={!ready?.goodRows} onClick={() => take('good-rows')}>
              Import the {shown.readings.length} good rows
            </Button>
          ) : null}
          {shown ? (
            <Button kind="main" loading={store.isPending} disabled={!ready?.all} onClick={() => take('all')}>
              Import all {formatCount(shown.rows.length, 'reading')}
            </Button>
          ) : null}
        </>
      }
    >
      <div className="flex flex-col gap-5">
        <FilePicker fileName={file?.name ?? null} onPick={(picked) => look(picked, null)} />
        {hasDraft || current ? (
          <Notice tone="caution">
            The file takes the place of {whatIsReplaced(hasDraft, current)}.
            {current ? ' Every saved revision stays and can be brought back.' : ''}
            {hasDraft ? ' Undo brings the unsaved rows back while the page is open.' : ''}
          </Notice>
        ) : null}
        <FormErrors title="Not read in" faults={[...formFaults(preview.error), ...formFaults(store.error)]} />
        {file && preview.isPending && !shown ? <Skeleton className="w-2/3" /> : null}
        {file && shown ? (
          <ImportPreviewView
            preview={shown}
            spreadType={sounding.spreadType}
            isStale={preview.isPending}
            unitsConfirmed={unitsConfirmed}
            onConfirmUnits={setUnitsConfirmed}
            onMapping={(mapping) => {
              setShown({ ...shown, mapping });
              look(file, mapping);
            }}
          />
        ) : null}
      </div>
    </Dialog>
  );
}

function whatIsReplaced(hasDraft: boolean, current: Revision | null): string {
  const saved = current
    ? `the ${formatCount(current.readings.length, 'reading')} of revision ${current.number}`
    : '';
  return [saved, hasDraft ? 'the rows that are not saved' : ''].filter((part) => part !== '').join(' and ');
}
