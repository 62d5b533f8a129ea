import type { FitResult, LayeredEarthModel } from '../../../server/contract/fit';
import { bedCount } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { formatFixed, formatMisfit } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';

export interface LayerLadderProps {
  counts: NonNullable<FitResult['layerCounts']>;
  /** Takes one count's model up, under the name given, to look at and to fit from. */
  onTakeUp: (earth: LayeredEarthModel, name: string) => void;
  /** Asks for a run of this count; absent where the reader may not run. */
  onAdopt?: ((earth: LayeredEarthModel) => void) | undefined;
}

const NOISE_WORDS = { true: 'yes', false: 'no', null: 'not testable' } as const;

/** Every count that was tried, with what decided between them. */
export function LayerLadder({ counts, onTakeUp, onAdopt }: LayerLadderProps) {
  return (
    <div className="max-w-4xl">
      <Table caption="Counts of beds that were tried">
        <TableHead>
          <HeaderCell numeric>Beds</HeaderCell>
          <HeaderCell numeric>χ²/N</HeaderCell>
          <HeaderCell numeric className="hidden sm:table-cell">
            BIC
          </HeaderCell>
          <HeaderCell>Within noise</HeaderCell>
          <HeaderCell>
            <span className="sr-only">Take up</span>
          </HeaderCell>
        </TableHead>
        <TableBody>
          {counts.map((count) => (
            <TableRow key={count.layers} selected={count.chosen}>
              <Cell numeric>{count.layers}</Cell>
              <Cell numeric>{formatMisfit(count.chi2PerReading)}</Cell>
              <Cell numeric className="hidden sm:table-cell">
                {formatFixed(count.bic, 1)}
              </Cell>
              <Cell>{NOISE_WORDS[`${count.withinNoise}`]}</Cell>
              <Cell className="text-right whitespace-nowrap">
                {count.chosen ? (
                  <span className="text-sm font-semibold">chosen</span>
                ) : (
                  <>
                    <Button
                      kind="quiet"
                      size="small"
                      onClick={() => onTakeUp(count.earth, `${bedCount(count.layers)}, from the ladder`)}
                    >
                      Look
                      <span className="sr-only"> at the model of {bedCount(count.layers)}</span>
                    </Button>
                    {onAdopt ? (
                      <Button kind="quiet" size="small" onClick={() => onAdopt(count.earth)}>
                        Adopt
                        <span className="sr-only"> {bedCount(count.layers)}</span>
                      </Button>
                    ) : null}
                  </>
                )}
              </Cell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
      <p className="mt-2 text-sm text-muted">
        Chosen is the fewest beds whose χ² lies below its 95 % point; where none does, the least BIC.
      </p>
    </div>
  );
}
