import type { RowFault } from '../../../server/contract/readings';
import { formatCount } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';

const MOST_SHOWN = 200;

/** Every fault of the file: where, what was found, what is allowed. */
export function ImportFaults({ faults }: { faults: readonly RowFault[] }) {
  if (faults.length === 0) return null;
  return (
    <div>
      <h3 className="mb-1 font-semibold text-rust">{formatCount(faults.length, 'fault')} in the file</h3>
      <Table caption="Faults in the file" frameClassName="max-h-56">
        <TableHead>
          <HeaderCell numeric>Line</HeaderCell>
          <HeaderCell>Column</HeaderCell>
          <HeaderCell>Found</HeaderCell>
          <HeaderCell>Fault</HeaderCell>
          <HeaderCell>Allowed</HeaderCell>
        </TableHead>
        <TableBody>
          {faults.slice(0, MOST_SHOWN).map((fault, i) => (
            <TableRow key={i}>
              <Cell numeric>{fault.row}</Cell>
              <Cell>{fault.column === '' ? 'whole row' : fault.column}</Cell>
              <Cell className="figure">{fault.found === '' ? 'nothing' : fault.found}</Cell>
              <Cell>{fault.message}</Cell>
              <Cell className="text-muted">{fault.allowed}</Cell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
      {faults.length > MOST_SHOWN ? (
        <p className="text-sm text-muted">The first {MOST_SHOWN} are listed.</p>
      ) : null}
    </div>
  );
}
