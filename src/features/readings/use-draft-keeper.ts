import { useEffect, useState } from 'react';
import { useMe } from '../../api/use-me';
import { DraftKeeper } from './draft-keeper';
import { useSendDraft } from './reading-mutations';

/** The keeper of one person's draft of one sheet; a device that others use too keeps each their own. */
export function useDraftKeeper(soundingId: string): DraftKeeper {
  const me = useMe();
  const send = useSendDraft(soundingId);
  const [keeper] = useState(
    () => new DraftKeeper({ key: `layerwell-sheet:${me.id}:${soundingId}`, storage: localStorage, send }),
  );
  useEffect(() => keeper.open(), [keeper]);
  useEffect(() => {
    const sendNow = () => void keeper.flush();
    window.addEventListener('online', sendNow);
    return () => window.removeEventListener('online', sendNow);
  }, [keeper]);
  return keeper;
}
