import { useQuery } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';
import { useParams } from 'react-router-dom';
import type { Sounding } from '../../../server/contract/soundings';
import { fieldSheetQuery } from '../../api/sounding-queries';
import { QueryView } from '../../app/query-view';
import { SoundingPage } from '../../soundings/sounding-page';
import { Kbd } from '../../ui/kbd';
import type { DraftKeeper } from './draft-keeper';
import { draftWords } from './draft-words';
import { FieldSheetView } from './field-sheet-view';
import { useDraftKeeper } from './use-draft-keeper';

export function FieldSheetPage() {
  const { soundingId = '' } = useParams();
  return <SheetPage key={soundingId} soundingId={soundingId} />;
}

function SheetPage({ soundingId }: { soundingId: string }) {
  const keeper = useDraftKeeper(soundingId);
  return (
    <SoundingPage
      section="Field sheet"
      layout="fill"
      status={(sounding) => <DraftStatus keeper={keeper} sounding={sounding} />}
      keys={() => <SheetKeys />}
    >
      {(sounding) => (
        <div className="w-full px-4 py-5 sm:px-7">
          <LoadedSheet sounding={sounding} keeper={keeper} />
        </div>
      )}
    </SoundingPage>
  );
}

function LoadedSheet({ sounding, keeper }: { sounding: Sounding; keeper: DraftKeeper }) {
  const fieldSheet = useQuery(fieldSheetQuery(sounding.id));
  return (
    <QueryView query={fieldSheet} loadingLabel="Loading the Field sheet" loadingLines={12}>
      {(data) => (
        // another spread has other columns, so the sheet is read anew
        <FieldSheetView key={sounding.spreadType} sounding={sounding} fieldSheet={data} keeper={keeper} />
      )}
    </QueryView>
  );
}

function DraftStatus({ keeper, sounding }: { keeper: DraftKeeper; sounding: Sounding }) {
  const state = useSyncExternalStore(keeper.subscribe, keeper.getState);
  const fieldSheet = useQuery(fieldSheetQuery(sounding.id));
  return (
    <output title={state.kind === 'unsent' ? state.reason : undefined}>
      {draftWords(state, fieldSheet.data?.revision?.number ?? null)}
    </output>
  );
}

function SheetKeys() {
  return (
    <p className="hidden flex-wrap items-center gap-x-4 gap-y-1 sm:flex">
      <span>
        <Kbd>↑</Kbd> <Kbd>↓</Kbd> <Kbd>Enter</Kbd> from row to row
      </span>
      <span>
        <Kbd>Ctrl V</Kbd> paste a block from a spreadsheet
      </span>
      <span>
        <Kbd>Ctrl Z</Kbd> undo
      </span>
    </p>
  );
}
