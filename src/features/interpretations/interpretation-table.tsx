import { Link } from 'react-router-dom';
import type { Interpretation } from '../../../server/contract/interpretations';
import { addressOf } from '../../app/addresses';
import { letterOfRun } from '../../runs/run-title';
import { formatGivenLength, formatMoment, withUnit } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { InterpretationStateMark } from '../../runs/interpretation-state-mark';

export interface InterpretationTableProps {
  soundingId: string;
  interpretations: readonly Interpretation[];
}

export function InterpretationTable({ soundingId, interpretations }: InterpretationTableProps) {
  return (
    <Table caption="Interpretations of this sounding">
      <TableHead>
        <HeaderCell>Title</HeaderCell>
        <HeaderCell>State</HeaderCell>
        <HeaderCell>Run</HeaderCell>
        <HeaderCell numeric>Beds</HeaderCell>
        <HeaderCell numeric>Water level</HeaderCell>
        <HeaderCell>Author</HeaderCell>
        <HeaderCell>Changed</HeaderCell>
      </TableHead>
      <TableBody>
        {interpretations.map((interpretation) => (
          <TableRow key={interpretation.id}>
            <Cell className="min-w-40">
              <Link
                to={addressOf('interpretation', { soundingId, interpretationId: interpretation.id })}
                className="inline-flex min-h-6 items-center font-semibold underline-offset-2 touch:min-h-11"
              >
                {interpretation.title}
              </Link>
            </Cell>
            <Cell>
              <InterpretationStateMark state={interpretation.state} />
            </Cell>
            <Cell className="figure">{letterOfRun({ number: interpretation.runNumber })}</Cell>
            <Cell numeric>{interpretation.beds.length}</Cell>
            <Cell numeric>
              {interpretation.waterLevelDepthM === null ? (
                <span className="font-sans text-muted">not given</span>
              ) : (
                withUnit(formatGivenLength(interpretation.waterLevelDepthM), 'm')
              )}
            </Cell>
            <Cell className="whitespace-nowrap">{interpretation.author.name}</Cell>
            <Cell className="whitespace-nowrap">{formatMoment(interpretation.updatedAt)}</Cell>
          </TableRow>
        ))}
      </TableBody>
    </Table>
  );
}
