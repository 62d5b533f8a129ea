import type { FitResult } from '../../../server/contract/fit-result';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import { MISFIT_LABEL, MISFIT_TITLE } from '../../runs/misfit-words';
import { bedCount } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { formatFixed, formatMisfit } from '../../ui/format';
import { Sentence } from '../../ui/sentence';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { noiseLimit, type NoiseLimit } from './noise-limit';

export interface LayerLadderProps {
  counts: NonNullable<FitResult['layerCounts']>;
  /** How many readings were fitted. */
  readings: number;
  /** Takes one count's model up, under the name given, to look at and to fit from. */
  onTakeUp: (earth: LayeredEarthModel, name: string) => void;
  /** Asks for a run of this count; absent where the reader may not run. */
  onAdopt?: ((earth: LayeredEarthModel) => void) | undefined;
}

const LIMIT_TITLE = 'χ²/N at the 95 % point of χ²: below it a misfit is within noise';
const DEGREES_TITLE = 'Degrees of freedom: readings less free values';
const NOISE_WORDS = { true: 'yes', false: 'no', null: 'not testable' } as const;

/** Every count that was tried, with what decided between them. */
export function LayerLadder({ counts, readings, onTakeUp, onAdopt }: LayerLadderProps) {
  return (
    <div className="max-w-4xl">
      <Table caption="Counts of beds that were tried">
        <TableHead>
          <HeaderCell numeric>Beds</HeaderCell>
          <HeaderCell numeric>
            <span title={MISFIT_TITLE}>{MISFIT_LABEL}</span>
          </HeaderCell>
          <HeaderCell numeric>
            <span title={LIMIT_TITLE}>Limit</span>
          </HeaderCell>
          <HeaderCell numeric className="hidden sm:table-cell">
            <span title={DEGREES_TITLE}>N − p</span>
          </HeaderCell>
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
              <LimitCells limit={noiseLimit(count, readings)} />
              <Cell numeric className="hidden sm:table-cell">
                {formatFixed(count.bic, 1)}
              </Cell>
              <Cell>{NOISE_WORDS[`${count.withinNoise}`]}</Cell>
              <Cell className="text-right whitespace-nowrap">
                {count.chosen ? (
                  <span className="text-sm font-semibold">chosen</span>
                ) : (
                  <span className="inline-flex flex-col items-end sm:flex-row">
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
                  </span>
                )}
              </Cell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
      <p className="mt-2 text-sm text-muted">
        Within noise means <Sentence text="χ²/N" /> below its limit: the 95&nbsp;% point of χ² with N − p
        degrees of freedom (readings less free values), over N. Chosen is the fewest beds within noise; where
        none is, the least BIC.
      </p>
    </div>
  );
}

/** What the misfit of a count is judged by; empty where it cannot be tested. */
function LimitCells({ limit }: { limit: NoiseLimit | null }) {
  return (
    <>
      <Cell numeric className="text-muted">
        {limit ? formatMisfit(limit.chi2PerReading) : ''}
      </Cell>
      <Cell numeric className="hidden text-muted sm:table-cell">
        {limit?.degrees}
      </Cell>
    </>
  );
}
