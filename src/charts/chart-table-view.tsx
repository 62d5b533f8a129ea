import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../ui/table';
import { cellText, type ChartTable } from './chart-table';

export function ChartTableView({ caption, table }: { caption: string; table: ChartTable }) {
  const isNumeric = (column: number) => table.rows.some((row) => typeof row[column] === 'number');
  return (
    <Table caption={caption} frameClassName="max-h-[32rem] min-h-0 flex-1">
      <TableHead>
        {table.columns.map((column, index) => (
          <HeaderCell
            key={column.label}
            numeric={isNumeric(index)}
            {...(column.unit ? { unit: column.unit } : {})}
          >
            {column.label}
          </HeaderCell>
        ))}
      </TableHead>
      <TableBody>
        {table.rows.map((row, rowIndex) => (
          <TableRow key={rowIndex}>
            {table.columns.map((column, index) => (
              <Cell key={column.label} numeric={isNumeric(index)} className="whitespace-nowrap">
                {cellText(row[index] ?? null, column)}
              </Cell>
            ))}
          </TableRow>
        ))}
      </TableBody>
    </Table>
  );
}
