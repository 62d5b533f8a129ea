import type { FitResult } from '../../../server/contract/fit-result';
import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import type { Run } from '../../../server/contract/runs';
import { boundaryDepths } from '../../charts/chart-data';
import type { ChartTable } from '../../charts/chart-table';
import { letterOfRun } from '../../runs/run-title';

/** A model as a table: one row a bed, depths in m, resistivity in Ω·m, 95 % ranges where a fit gave them. */
export function modelTable(earth: LayeredEarthModel, result: FitResult | null): ChartTable {
  const bases = boundaryDepths(earth);
  const range = (bounds: readonly [number | null, number | null] | undefined) => bounds ?? [null, null];
  return {
    columns: [
      { label: 'Bed' },
      { label: 'Top', unit: 'm' },
      { label: 'Base', unit: 'm' },
      { label: 'Thickness', unit: 'm' },
      { label: 'Thickness 95 % low', unit: 'm' },
      { label: 'Thickness 95 % high', unit: 'm' },
      { label: 'Resistivity', unit: 'ohm m' },
      { label: 'Resistivity 95 % low', unit: 'ohm m' },
      { label: 'Resistivity 95 % high', unit: 'ohm m' },
    ],
    rows: earth.resistivity.map((resistivity, i) => [
      i + 1,
      i === 0 ? 0 : (bases[i - 1] ?? null),
      bases[i] ?? null,
      earth.thickness[i] ?? null,
      ...range(result?.intervals.thickness[i]),
      resistivity,
      ...range(result?.intervals.resistivity[i]),
    ]),
  };
}

export interface ModelFileInput {
  soundingName: string;
  earth: LayeredEarthModel;
  /** The run the model is of; null for a model by hand. */
  run: Run | null;
}

/** The model with all that is needed to compute it again: what was asked, by which engine, from which readings. */
export function modelJson({ soundingName, earth, run }: ModelFileInput): string {
  const origin = run
    ? {
        run: letterOfRun(run),
        runId: run.id,
        requestedAt: run.requestedAt,
        revision: run.revisionNumber,
        computationKey: run.computationKey,
        engine: run.engineVersion,
        settings: run.settings,
        readings: run.readings,
        result: run.result,
      }
    : { run: null };
  const content = {
    sounding: soundingName,
    units: { resistivity: 'ohm m', thickness: 'm' },
    earth,
    ...origin,
  };
  return `${JSON.stringify(content, null, 2)}\n`;
}
