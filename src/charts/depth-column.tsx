import type { GroundColumn } from './chart-data';
import { DepthColumns, type DepthColumnsProps } from './depth-columns';

export interface DepthColumnProps extends Omit<DepthColumnsProps, 'columns' | 'selected' | 'onSelectBed'> {
  column: GroundColumn;
  selectedBed?: number | null;
  onSelectBed?: (bed: number) => void;
}

/** One ground, as on the Bench. */
export function DepthColumn({ column, selectedBed, onSelectBed, ...rest }: DepthColumnProps) {
  return (
    <DepthColumns
      {...rest}
      columns={[column]}
      {...(selectedBed === undefined
        ? {}
        : { selected: selectedBed === null ? null : { columnId: column.id, bed: selectedBed } })}
      {...(onSelectBed ? { onSelectBed: (_, bed) => onSelectBed(bed) } : {})}
    />
  );
}
