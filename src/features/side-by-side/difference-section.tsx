import type { BedDifference, FitPairComparison } from '../../../inversion';
import type { Run } from '../../../server/contract/runs';
import { letterOfRun } from '../../runs/run-title';
import { formatSignificant, HELD } from '../../ui/format';
import { Sentence } from '../../ui/sentence';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';

export interface DifferenceSectionProps {
  base: Run;
  other: Run;
  pair: FitPairComparison;
}

const QUANTITY_WORDS: Record<BedDifference['quantity'], string> = {
  resistivity: 'ρ',
  thickness: 'thickness',
  depth: 'depth of the base',
  conductance: 'h/ρ',
  resistance: 'hρ',
};

const OVERLAP_WORDS = { true: 'overlap', false: 'apart', null: '' } as const;

/** One run held against the base: in words, then number by number. */
export function DifferenceSection({ base, other, pair }: DifferenceSectionProps) {
  const [first, second] = [letterOfRun(base), letterOfRun(other)];
  const title = `${first} and ${second}`;
  return (
    <section aria-label={`Runs ${title}`} className="break-inside-avoid">
      <h2 className="font-semibold">{title}</h2>
      <p className="mt-1 max-w-3xl">
        <Sentence text={pair.text} />
      </p>
      {pair.beds.length === 0 ? null : <NumbersTable first={first} second={second} beds={pair.beds} />}
    </section>
  );
}

interface NumbersTableProps {
  first: string;
  second: string;
  beds: readonly BedDifference[];
}

function NumbersTable({ first, second, beds }: NumbersTableProps) {
  return (
    <details className="mt-2">
      <summary className="min-h-6 w-fit rounded text-muted hover:text-ink touch:min-h-11">
        Differences in numbers
      </summary>
      <Table caption={`Runs ${first} and ${second} in numbers`} className="mt-1 max-w-3xl">
        <TableHead>
          <HeaderCell>Bed</HeaderCell>
          <HeaderCell>Quantity</HeaderCell>
          <HeaderCell numeric>{first}</HeaderCell>
          <HeaderCell numeric>{second}</HeaderCell>
          <HeaderCell>Unit</HeaderCell>
          <HeaderCell numeric>
            {second}/{first}
          </HeaderCell>
          <HeaderCell unit={'95\u00a0%'}>Ranges</HeaderCell>
        </TableHead>
        <TableBody>
          {beds.map((difference) => (
            <TableRow key={`${difference.bed} ${difference.quantity}`}>
              <Cell className="figure">{difference.bed + 1}</Cell>
              <Cell>{QUANTITY_WORDS[difference.quantity]}</Cell>
              <Cell numeric>{formatSignificant(difference.first)}</Cell>
              <Cell numeric>{formatSignificant(difference.second)}</Cell>
              <Cell className="figure text-muted">{difference.unit}</Cell>
              <Cell numeric>{formatSignificant(difference.ratio)}</Cell>
              <RangesCell difference={difference} />
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </details>
  );
}

function RangesCell({ difference: { isHeld, intervalsOverlap } }: { difference: BedDifference }) {
  if (isHeld) return <Cell className="text-muted">{HELD}</Cell>;
  return (
    <Cell className={intervalsOverlap === false ? 'font-semibold text-copper' : ''}>
      {OVERLAP_WORDS[`${intervalsOverlap}`]}
    </Cell>
  );
}
