import { Ellipsis } from 'lucide-react';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { SurveyCan } from '../../../server/contract/roles';
import type { RunSummary } from '../../../server/contract/runs';
import { messageOf } from '../../api/api-error';
import { addressOf } from '../../app/addresses';
import { hasBeds } from '../../runs/run-standing';
import { letterOfRun } from '../../runs/run-title';
import { IconButton } from '../../ui/icon-button';
import { Menu, MenuItem } from '../../ui/menu';
import { showToast } from '../../ui/show-toast';
import { useRecomputeRun, useUpdateRunNote } from './bench-mutations';
import { RunNoteDialog } from './run-note-dialog';

/** What can be done with one run; only what the reader's role allows. */
export function LedgerMenu({ run, can }: { run: RunSummary; can: SurveyCan }) {
  const [isWriting, setIsWriting] = useState(false);
  const navigate = useNavigate();
  const updateNote = useUpdateRunNote(run.soundingId);
  const recompute = useRecomputeRun(run.soundingId);
  const isFinished = run.state === 'finished';
  const letter = letterOfRun(run);
  const mayInterpret = can.interpret && isFinished && hasBeds(run);
  if (!can.annotateRuns && !(can.recompute && isFinished) && !mayInterpret) return <span />;
  const tell = (title: string) => (error: Error) =>
    showToast({ kind: 'bad', title, description: messageOf(error) });
  const pin = () =>
    updateNote.mutate(
      { runId: run.id, change: { pinned: !run.note.pinned }, version: run.note.version },
      { onError: tell(`Run ${letter} was not ${run.note.pinned ? 'unpinned' : 'pinned'}`) },
    );
  const interpret = () =>
    void navigate(`${addressOf('interpretations', { soundingId: run.soundingId })}?start=${run.id}`);
  return (
    <>
      <Menu trigger={<IconButton label={`Run ${letter}: more`} icon={<Ellipsis aria-hidden size={16} />} />}>
        {mayInterpret ? <MenuItem onSelect={interpret}>Interpret this run</MenuItem> : null}
        {can.annotateRuns ? (
          <>
            <MenuItem onSelect={() => setIsWriting(true)}>Label and note</MenuItem>
            <MenuItem onSelect={pin}>{run.note.pinned ? 'Unpin' : 'Pin'}</MenuItem>
          </>
        ) : null}
        {can.recompute && isFinished ? (
          <MenuItem
            onSelect={() =>
              recompute.mutate(run.id, { onError: tell(`Run ${letter} was not computed again`) })
            }
          >
            Compute again
          </MenuItem>
        ) : null}
      </Menu>
      {isWriting ? <RunNoteDialog run={run} onClose={() => setIsWriting(false)} /> : null}
    </>
  );
}
