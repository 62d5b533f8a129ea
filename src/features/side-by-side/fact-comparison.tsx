import type { Run } from '../../../server/contract/runs';
import { MISFIT_LABEL, MISFIT_TITLE } from '../../runs/misfit-words';
import { Sentence } from '../../ui/sentence';
import { Cell, Table, TableBody, TableRow } from '../../ui/table';
import type { FactRow } from './run-facts-table';
import { RunHeads } from './run-heads';
import { tableWidth } from './table-width';

export interface FactComparisonProps {
  title: string;
  runs: readonly Run[];
  rows: readonly FactRow[];
}

/** Facts of each run in one row; a row whose values differ is marked by weight and by word. */
export function FactComparison({ title, runs, rows }: FactComparisonProps) {
  return (
    <section aria-label={title}>
      <h2 className="mb-1 font-semibold">{title}</h2>
      <Table caption={title} className="table-fixed" style={tableWidth(runs.length)}>
        <RunHeads runs={runs} first="Of the run" />
        <TableBody>
          {rows.map((row) => (
            <TableRow key={row.label}>
              <Cell className="align-top text-muted">
                <span title={row.label === MISFIT_LABEL ? MISFIT_TITLE : undefined}>
                  <Sentence text={row.label} />
                </span>
                {row.differs ? <span className="block text-xs text-copper">differs</span> : null}
              </Cell>
              {row.values.map((value, i) => (
                <Cell
                  key={runs[i]?.id ?? i}
                  className={row.differs ? 'align-top font-semibold' : 'align-top'}
                >
                  <Sentence text={value} />
                </Cell>
              ))}
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </section>
  );
}
