import { darZarrouk } from '../../../inversion';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import { isRejected } from '../../runs/rejected-fit';
import { MISFIT_LABEL, MISFIT_TITLE } from '../../runs/misfit-words';
import { MisfitLine } from '../../runs/rejected-mark';
import { FigureStrip, type FigureItem } from '../../ui/figure-strip';
import { formatLength, formatMisfit, formatPercent, formatSignificant, withUnit } from '../../ui/format';
import { Sentence } from '../../ui/sentence';
import type { ModelVerdict } from './hand-verdict';

export interface FiguresProps {
  earth: LayeredEarthModel;
  misfit: { chi2PerReading: number; rmsPercent: number } | null;
  /** The run whose model it is; null for a model by hand. */
  fit: { misfitProbability: number | null } | null;
  /** Of a model by hand or of the ladder; null for that of a run. */
  verdict: ModelVerdict | null;
  /** The ground has cells of a grid, and what lies above the last of them means nothing. */
  isCells: boolean;
}

/** The few numbers a model is judged by: how it fits, and what it conducts along and across. */
export function FiguresOfModel({ earth, misfit, fit, verdict, isCells }: FiguresProps) {
  const sums = darZarrouk(earth);
  const last = earth.resistivity.length;
  const depth = earth.thickness.reduce((sum, h) => sum + h, 0);
  const reach = `to ${withUnit(formatLength(depth), 'm')}`;
  const chi2 = misfit ? formatMisfit(misfit.chi2PerReading) : '–';
  const closeness: FigureItem[] = [
    {
      value: isRejected(fit) || verdict?.rejects ? <span className="text-rust">{chi2}</span> : chi2,
      label: <span title={MISFIT_TITLE}>{MISFIT_LABEL}</span>,
    },
    { value: misfit ? formatPercent(misfit.rmsPercent) : '–', label: 'rms misfit' },
  ];
  const along: FigureItem[] = [
    {
      value: withUnit(formatSignificant(sums.totalConductanceS), 'S'),
      label: <Sentence text={`S\u00a0=\u00a0Σh/ρ ${reach}`} />,
    },
    {
      value: withUnit(formatSignificant(sums.totalResistanceOhmM2), 'Ω·m²'),
      label: <Sentence text={`T\u00a0=\u00a0Σhρ ${reach}`} />,
    },
  ];
  return (
    <div>
      <FigureStrip items={closeness} />
      <MisfitLine fit={fit} />
      {verdict ? <VerdictLine {...verdict} /> : null}
      {last > 1 && !isCells ? (
        <div className="-mt-px">
          <FigureStrip items={along} />
        </div>
      ) : null}
    </div>
  );
}

function VerdictLine({ words, rejects, title }: ModelVerdict) {
  return (
    <p className="border-b border-rule py-1.5 text-sm" title={title}>
      <span className={rejects ? 'font-semibold text-rust' : undefined}>This model {words}.</span>
      <span className="sr-only"> {title}.</span>
    </p>
  );
}
