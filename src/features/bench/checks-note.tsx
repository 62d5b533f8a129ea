import { Link } from 'react-router-dom';
import type { Revision } from '../../../server/contract/readings';
import type { Run } from '../../../server/contract/runs';
import { addressOf } from '../../app/addresses';
import { formatCount } from '../../ui/format';

interface ChecksNoteProps {
  /** The readings as they are saved now. */
  revision: Pick<Revision, 'id' | 'soundingId' | 'checks'>;
  /** The run that is shown; its readings may be older ones. */
  run: Pick<Run, 'revisionId'> | null;
}

/** Doubts that the Field sheet has of the readings a model stands on; it alone says what they are. */
export function ChecksNote({ revision, run }: ChecksNoteProps) {
  const { id, soundingId, checks } = revision;
  if (checks.length === 0 || (run !== null && run.revisionId !== id)) return null;
  return (
    <p>
      <Link to={addressOf('readings', { soundingId })} className="underline underline-offset-2">
        The checks of the Field sheet
      </Link>{' '}
      found {formatCount(checks.length, 'thing')} to doubt in these readings.
    </p>
  );
}
