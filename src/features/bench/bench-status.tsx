import { useQuery } from '@tanstack/react-query';
import { runListQuery } from '../../api/run-queries';
import { fieldSheetQuery } from '../../api/sounding-queries';
import { formatCount } from '../../ui/format';

/** Which readings stand on the Bench, and what is still being computed. */
export function BenchStatus({ soundingId }: { soundingId: string }) {
  const sheet = useQuery(fieldSheetQuery(soundingId));
  const runs = useQuery(runListQuery(soundingId));
  const underWay = runs.data?.items.filter((run) => run.state === 'queued' || run.state === 'running') ?? [];
  const words = [
    sheet.data?.revision ? `readings revision ${sheet.data.revision.number}` : null,
    sheet.data?.draft ? 'draft on the Field sheet not saved' : null,
    underWay.length > 0 ? `${formatCount(underWay.length, 'run')} under way` : null,
  ].filter((word) => word !== null);
  return <span>{words.join(', ')}</span>;
}
