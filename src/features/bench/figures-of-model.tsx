import type { ReactNode } from 'react';
import { darZarrouk } from '../../../inversion';
import type { LayeredEarthModel } from '../../../server/contract/fit';
import { FigureStrip } from '../../ui/figure-strip';
import { formatFixed, formatPercent, formatSignificant, withUnit } from '../../ui/format';

export interface FiguresProps {
  earth: LayeredEarthModel;
  misfit: { chi2PerReading: number; rmsPercent: number } | null;
}

/** The few numbers a model is judged by: how it fits, and what it conducts along and across. */
export function FiguresOfModel({ earth, misfit }: FiguresProps) {
  const sums = darZarrouk(earth);
  const above = earth.thickness.length === 0 ? '' : ` above bed ${earth.resistivity.length}`;
  const items: { value: ReactNode; label: ReactNode }[] = [
    { value: misfit ? formatFixed(misfit.chi2PerReading, 2) : '–', label: 'χ² per reading' },
    { value: misfit ? formatPercent(misfit.rmsPercent) : '–', label: 'rms misfit' },
  ];
  if (earth.thickness.length > 0)
    items.push(
      { value: withUnit(formatSignificant(sums.totalConductanceS), 'S'), label: `S = Σh/ρ${above}` },
      { value: withUnit(formatSignificant(sums.totalResistanceOhmM2), 'Ω·m²'), label: `T = Σhρ${above}` },
    );
  return <FigureStrip items={items} />;
}
