import type { ImportMapping, ImportPreview, SheetColumn } from '../../../server/contract/readings';
import { sheetColumnsOf } from '../../../server/contract/sheet-columns';
import type { SpreadType } from '../../../server/contract/spread';
import { classNames } from '../../ui/class-names';
import { Select } from '../../ui/select';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { gridColumnName, gridColumnUnit } from './sheet-columns-view';

const MOST_SHOWN = 100;

interface ImportTableProps {
  preview: ImportPreview;
  spreadType: SpreadType;
  onMapping: (mapping: ImportMapping) => void;
}

/** The columns of the file with what each is taken for, and its rows as they would stand on the sheet. */
export function ImportTable({ preview, spreadType, onMapping }: ImportTableProps) {
  const { headings, mapping, rows, faults } = preview;
  const faultyLines = new Map(faults.map((fault) => [fault.row, fault]));
  const width = Math.max(headings.length, mapping.columns.length);
  const columns = Array.from({ length: width }, (_, i) => mapping.columns[i] ?? null);
  const choose = (index: number, chosen: SheetColumn | null) =>
    onMapping({
      ...mapping,
      // a column of the sheet is filled by one column of the file
      columns: columns.map((column, i) => (i === index ? chosen : column === chosen ? null : column)),
    });
  return (
    <div>
      <h3 className="mb-1 font-semibold">Columns and rows</h3>
      <Table caption="Columns and rows of the file" frameClassName="max-h-80">
        <TableHead>
          <HeaderCell numeric>Line</HeaderCell>
          {columns.map((column, i) => (
            <HeaderCell key={i} className="align-bottom">
              <span className="mb-1 block font-normal">
                {headings[i] === undefined || headings[i] === '' ? `Column ${i + 1}` : headings[i]}
              </span>
              <ColumnSelect
                label={`What column ${i + 1} holds`}
                spreadType={spreadType}
                units={mapping.units}
                value={column}
                onChange={(chosen) => choose(i, chosen)}
              />
            </HeaderCell>
          ))}
        </TableHead>
        <TableBody>
          {rows.slice(0, MOST_SHOWN).map((row) => {
            const fault = faultyLines.get(row.line);
            return (
              <TableRow key={row.line} className={classNames(fault && 'bg-rust-tint')} title={fault?.message}>
                <Cell numeric>{row.line}</Cell>
                {columns.map((column, i) => (
                  <Cell
                    key={i}
                    numeric={column !== 'remark'}
                    className={classNames(column !== null && fault?.column === headings[i] && 'text-rust')}
                  >
                    {column === null ? '' : (row.cells[column] ?? '')}
                  </Cell>
                ))}
              </TableRow>
            );
          })}
        </TableBody>
      </Table>
      {rows.length > MOST_SHOWN ? (
        <p className="text-sm text-muted">
          The first {MOST_SHOWN} of {rows.length} rows are shown; all are read.
        </p>
      ) : null}
    </div>
  );
}

interface ColumnSelectProps {
  label: string;
  spreadType: SpreadType;
  units: ImportMapping['units'];
  value: SheetColumn | null;
  onChange: (column: SheetColumn | null) => void;
}

function ColumnSelect({ label, spreadType, units, value, onChange }: ColumnSelectProps) {
  const options = sheetColumnsOf(spreadType).map((column) => {
    const unit = gridColumnUnit(column, units);
    const name = gridColumnName(column, spreadType);
    return { value: column, label: unit === '' ? name : `${name}, ${unit}` };
  });
  const choose = (text: string) => onChange(options.find((option) => option.value === text)?.value ?? null);
  return (
    <Select
      aria-label={label}
      className="min-w-32 font-normal"
      options={options}
      placeholder="not used"
      value={value ?? ''}
      onChange={(event) => choose(event.target.value)}
    />
  );
}
