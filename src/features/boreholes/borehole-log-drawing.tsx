import type { Borehole } from '../../../server/contract/surveys';
import { boreholeLog } from '../../boreholes/borehole-log';
import { BoreholeBar } from '../../charts/borehole-bar';
import { useChartPalette } from '../../charts/chart-palette';
import { DepthAxis } from '../../charts/depth-axis';
import { depthScale } from '../../charts/depth-scale';
import { useBoxSize } from '../../charts/use-box-size';

const AXIS_PX = 44;
const PAD_PX = 12;

interface BoreholeLogDrawingProps {
  borehole: Borehole;
  /** Of the drawing's axis; the same for every hole of a page, so that they compare. */
  maxDepthM: number;
  height: number;
}

/** Depth points down; each interval carries the driller's words. */
export function BoreholeLogDrawing({ borehole, maxDepthM, height }: BoreholeLogDrawingProps) {
  const palette = useChartPalette();
  const { ref, size } = useBoxSize<HTMLDivElement>();
  const scale = depthScale('linear', { minDepth: 0.1, maxDepth: maxDepthM }, height - 2 * PAD_PX);
  return (
    <div ref={ref} className="min-w-0">
      {size.width > 0 ? (
        <svg width={size.width} height={height} className="block">
          <g transform={`translate(0 ${PAD_PX})`}>
            <DepthAxis scale={scale} x={AXIS_PX} width={size.width - AXIS_PX} palette={palette} />
            <BoreholeBar
              log={boreholeLog(borehole)}
              scale={scale}
              x={AXIS_PX + 14}
              width={size.width - AXIS_PX - 18}
              palette={palette}
            />
          </g>
        </svg>
      ) : null}
    </div>
  );
}
