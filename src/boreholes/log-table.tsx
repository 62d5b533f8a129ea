import type { Borehole } from '../../server/contract/surveys';
import { formatGivenLength } from '../ui/format';

/** The contacts in numbers, with the driller's words whole. */
export function LogTable({ borehole }: { borehole: Borehole }) {
  if (borehole.intervals.length === 0) return <p className="text-muted">No log.</p>;
  return (
    <table aria-label={`Log of ${borehole.name}`} className="w-full text-left">
      <thead className="sr-only">
        <tr>
          <th scope="col">Depth, m</th>
          <th scope="col">Ground</th>
        </tr>
      </thead>
      <tbody>
        {borehole.intervals.map(({ topM, baseM, description }) => (
          <tr key={topM} className="border-t border-rule align-baseline">
            <th scope="row" className="figure w-28 py-1 pr-3 font-normal whitespace-nowrap text-muted">
              {formatGivenLength(topM)}–{formatGivenLength(baseM)}&nbsp;m
            </th>
            <td className="py-1">{description}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
