import type { ImportMapping, ImportPreview } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';
import { Checkbox } from '../../ui/checkbox';
import { classNames } from '../../ui/class-names';
import { formatCount } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { CheckList } from './check-list';
import { ImportFaults } from './import-faults';
import { ImportFormat } from './import-format';
import { ImportTable } from './import-table';
import { unitsInWords, UnitsChooser } from './units-chooser';

interface ImportPreviewViewProps {
  preview: ImportPreview;
  spreadType: SpreadType;
  /** A newer reading of the file is on its way. */
  isStale: boolean;
  unitsConfirmed: boolean;
  onConfirmUnits: (confirmed: boolean) => void;
  onMapping: (mapping: ImportMapping) => void;
}

export function ImportPreviewView(props: ImportPreviewViewProps) {
  const { preview, spreadType, isStale, unitsConfirmed, onConfirmUnits, onMapping } = props;
  const { mapping, faults, readings, rows, missingColumns, unitsStated, checks } = preview;
  return (
    <div className={classNames('flex flex-col gap-5', isStale && 'opacity-60')} aria-busy={isStale}>
      <p>
        <b>{formatCount(rows.length, 'row')}</b>: {formatCount(readings.length, 'good reading')},{' '}
        {formatCount(faults.length, 'fault')}. <span className="text-muted">SHA-256 </span>
        <span className="figure text-sm text-muted">{preview.sha256.slice(0, 16)}</span>
      </p>
      <ImportFormat mapping={mapping} onChange={onMapping} />
      <fieldset className="flex flex-col gap-3">
        <legend className="mb-2 font-semibold">Units of the file</legend>
        <UnitsChooser
          units={mapping.units}
          onChange={(units) => {
            onConfirmUnits(true);
            onMapping({ ...mapping, units });
          }}
        />
        {unitsStated ? (
          <p className="text-sm text-muted">Found in the headings of the file.</p>
        ) : (
          <Checkbox
            checked={unitsConfirmed}
            onChange={(event) => onConfirmUnits(event.target.checked)}
            label={`The numbers of the file are in ${unitsInWords(mapping.units)}`}
            hint="The headings do not name every unit; a person must state them."
          />
        )}
      </fieldset>
      {missingColumns.length > 0 ? (
        <Notice tone="fault" title="Columns are missing">
          {missingColumns.join('; ')}. Choose below which column of the file holds each.
        </Notice>
      ) : null}
      <ImportFaults faults={faults} />
      <ImportTable preview={preview} spreadType={spreadType} onMapping={onMapping} />
      {checks.length > 0 ? <CheckList readings={preview.readings.length} checks={checks} /> : null}
    </div>
  );
}
