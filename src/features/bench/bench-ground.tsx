import type { GroundColumn } from '../../charts/chart-data';
import { DepthColumn, type DepthColumnProps } from '../../charts/depth-column';
import { hasCells } from '../../../inversion';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { columnOfHand, columnOfRun } from '../../runs/curve-of-run';
import { letterOfRun } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { BedTable } from './bed-table';
import { valuesOfModel } from './fit-form';
import { HandBar } from './hand-bar';
import { withBoundary, withResistivityScaled } from './hand-model';
import { heldKey } from './hand-model-store';
import { ModelSaveMenu } from './model-save-menu';
import type { ModelHandle } from './use-model';

export interface BenchGroundProps {
  /** The same ground twice: drawn, and in numbers. */
  part: 'column' | 'table';
  sounding: Sounding;
  run: Run | null;
  model: ModelHandle;
  selectedBed: number | null;
  onSelectBed: (bed: number | null) => void;
}

export function BenchGround({ part, ...props }: BenchGroundProps) {
  const { model } = props;
  if (!model.earth)
    return part === 'column' ? <NoGround model={model} mayFit={props.sounding.can.run} /> : null;
  return part === 'column' ? <Column {...props} /> : <Numbers {...props} />;
}

function NoGround({ model, mayFit }: { model: ModelHandle; mayFit: boolean }) {
  return (
    <div>
      <h2 className="font-semibold">Ground</h2>
      <p className="mt-1 text-muted">
        No model yet.
        {mayFit ? ' Fit the readings, or begin with a model by hand and see its curve at once.' : null}
      </p>
      {mayFit && model.begin ? (
        <Button size="small" className="mt-3" onClick={model.begin}>
          Begin by hand
        </Button>
      ) : null}
    </div>
  );
}

function Column({ sounding, run, model, selectedBed, onSelectBed }: Omit<BenchGroundProps, 'part'>) {
  const { earth } = model;
  if (!earth) return null;
  const held = valuesOfModel(earth).filter((value) => model.held.includes(heldKey(value)));
  const column: GroundColumn | null = model.hand
    ? columnOfHand(model.hand, model.handName, held)
    : run && columnOfRun(run);
  if (!column) return null;
  const moves: Pick<DepthColumnProps, 'onMoveBoundary' | 'onScaleResistivity'> = column.isCells
    ? {}
    : {
        onMoveBoundary: (boundary, depth, gesture) =>
          model.edit(withBoundary(earth, boundary, depth), gesture),
        onScaleResistivity: (bed, factor) => model.edit(withResistivityScaled(earth, bed, factor)),
      };
  return (
    <DepthColumn
      // One id for run and hand, so that the drawing keeps its focus and its drag when the first edit is made.
      column={{ ...column, id: 'ground', letter: '', held: [...(column.held ?? []), ...held] }}
      title="Ground"
      subject={sounding.name}
      height={520}
      selectedBed={selectedBed}
      onSelectBed={onSelectBed}
      {...moves}
    />
  );
}

/** A ground of cells is read from its drawing and the table behind it; there are no beds to take hold of. */
function CellsNote({ model, mayFit }: { model: ModelHandle; mayFit: boolean }) {
  return (
    <section className="max-w-prose">
      <h2 className="font-semibold">Cells</h2>
      <p className="mt-1 text-muted">
        This ground has cells of a fixed grid, which are no beds. The table of the drawing has every cell with
        its range.
      </p>
      {mayFit && model.begin ? (
        <Button size="small" className="mt-3" onClick={model.begin}>
          Begin beds by hand
        </Button>
      ) : null}
    </section>
  );
}

function Numbers({ sounding, run, model, selectedBed, onSelectBed }: Omit<BenchGroundProps, 'part'>) {
  const { earth } = model;
  if (!earth) return null;
  const shownRun = model.hand ? null : run;
  if (shownRun?.result && hasCells(shownRun.result))
    return <CellsNote model={model} mayFit={sounding.can.run} />;
  return (
    <section className="flex max-w-4xl flex-col gap-1">
      <HandBar model={model} runLetter={run ? letterOfRun(run) : null}>
        <ModelSaveMenu soundingName={sounding.name} earth={earth} run={shownRun} />
      </HandBar>
      <BedTable
        earth={earth}
        result={shownRun?.result ?? null}
        heldInRun={shownRun ? shownRun.settings.fixed.map(heldKey) : []}
        held={model.held}
        onEdit={sounding.can.run ? (next) => model.edit(next) : null}
        onHold={sounding.can.run ? model.setHeld : null}
        selectedBed={selectedBed}
        onSelectBed={onSelectBed}
      />
    </section>
  );
}
