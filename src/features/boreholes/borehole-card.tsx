import type { Borehole } from '../../../server/contract/surveys';
import { LogTable } from '../../boreholes/log-table';
import { Button } from '../../ui/button';
import { formatDay, formatGivenLength, withUnit } from '../../ui/format';
import { BoreholeLogDrawing } from './borehole-log-drawing';

interface BoreholeCardProps {
  borehole: Borehole;
  maxDepthM: number;
  onEdit?: () => void;
}

/** To the centimetre, without zeros that say nothing. */
const coordinate = (value: number): string => String(Number(value.toFixed(2)));

const metres = (value: number): string => withUnit(formatGivenLength(value), 'm');

export function BoreholeCard({ borehole, maxDepthM, onEdit }: BoreholeCardProps) {
  const { name, note, intervals } = borehole;
  return (
    <li
      id={borehole.id}
      className="flex min-w-0 flex-col gap-3 border-t border-rule pt-3 target:border-water"
    >
      <div className="flex items-start justify-between gap-3">
        <div className="min-w-0">
          <h2 className="text-lg font-semibold">{name}</h2>
          <ul className="flex flex-wrap gap-x-4 text-sm text-muted">
            {facts(borehole).map((fact) => (
              <li key={fact} className="whitespace-nowrap">
                {fact}
              </li>
            ))}
          </ul>
        </div>
        {onEdit ? (
          <Button size="small" aria-label={`Edit ${name}`} onClick={onEdit}>
            Edit
          </Button>
        ) : null}
      </div>
      {intervals.length === 0 ? null : (
        <BoreholeLogDrawing borehole={borehole} maxDepthM={maxDepthM} height={340} />
      )}
      <LogTable borehole={borehole} />
      <WaterLevels borehole={borehole} />
      {note === '' ? null : <p className="max-w-prose whitespace-pre-wrap">{note}</p>}
    </li>
  );
}

function facts({ depthM, drilledOn, xM, yM, elevationM }: Borehole): string[] {
  const parts = [`${metres(depthM)} deep`];
  if (drilledOn !== null) parts.push(`drilled ${formatDay(drilledOn)}`);
  if (xM !== null && yM !== null) parts.push(`x ${coordinate(xM)}, y ${withUnit(coordinate(yM), 'm')}`);
  if (elevationM !== null) parts.push(`elevation ${withUnit(coordinate(elevationM), 'm')}`);
  return parts;
}

function WaterLevels({ borehole }: { borehole: Borehole }) {
  const levels = borehole.waterLevels.toSorted((a, b) => b.measuredOn.localeCompare(a.measuredOn));
  if (levels.length === 0) return <p className="text-muted">No water level.</p>;
  return (
    <table className="w-full max-w-xs text-left">
      <caption className="mb-1 text-left font-semibold">
        Water levels <span className="font-normal text-muted">depth below ground</span>
      </caption>
      <tbody>
        {levels.map(({ measuredOn, depthM }, i) => (
          <tr key={i} className="border-t border-rule">
            <th scope="row" className="figure py-1 font-normal text-muted">
              {formatDay(measuredOn)}
            </th>
            <td className="figure py-1 text-right">
              {depthM < 0 ? `${metres(-depthM)} above ground` : metres(depthM)}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
