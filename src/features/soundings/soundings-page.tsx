import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Survey } from '../../../server/contract/surveys';
import { soundingListQuery } from '../../api/sounding-queries';
import { QueryView } from '../../app/query-view';
import { SurveyFrame } from '../../app/survey-frame';
import { Button } from '../../ui/button';
import { PageHeader } from '../../ui/page-header';
import { Pager } from '../../ui/pager';
import { EmptyState } from '../../ui/view-states';
import { NewSoundingDialog } from './new-sounding-dialog';
import { SoundingFilters } from './sounding-filters';
import {
  isFiltered,
  PAGE_SIZE,
  readListParams,
  sortedBy,
  writeListParams,
  type SoundingListParams,
} from './sounding-list-params';
import { SoundingTable } from './sounding-table';

export function SoundingsPage() {
  return <SurveyFrame section="Soundings">{(survey) => <Soundings survey={survey} />}</SurveyFrame>;
}

function Soundings({ survey }: { survey: Survey }) {
  const [search, setSearch] = useSearchParams();
  const [creating, setCreating] = useState(false);
  const params = readListParams(search);
  const show = (next: SoundingListParams) => setSearch(writeListParams(next), { replace: true });
  const soundings = useQuery(soundingListQuery(survey.id, { ...params, pageSize: PAGE_SIZE }));
  const mayAdd = survey.can.editSoundings;
  const add = mayAdd ? (
    <Button kind="main" onClick={() => setCreating(true)}>
      New sounding
    </Button>
  ) : null;
  return (
    <>
      <PageHeader title="Soundings" note={survey.name} actions={add} />
      <SoundingFilters surveyId={survey.id} params={params} onChange={show} />
      <QueryView query={soundings} loadingLabel="Loading soundings" loadingLines={12}>
        {({ items, total, page, pageSize }) =>
          total === 0 ? (
            <NoSoundings
              filtered={isFiltered(params)}
              mayAdd={mayAdd}
              onClear={() => setSearch(new URLSearchParams(), { replace: true })}
            />
          ) : (
            <div className={soundings.isPlaceholderData ? 'opacity-60' : undefined}>
              <SoundingTable items={items} params={params} onSort={(sort) => show(sortedBy(params, sort))} />
              <Pager
                page={page}
                pageSize={pageSize}
                total={total}
                what="sounding"
                onPage={(next) => setSearch(writeListParams({ ...params, page: next }))}
              />
            </div>
          )
        }
      </QueryView>
      {creating ? <NewSoundingDialog surveyId={survey.id} onClose={() => setCreating(false)} /> : null}
    </>
  );
}

function NoSoundings(props: { filtered: boolean; mayAdd: boolean; onClear: () => void }) {
  if (props.filtered)
    return (
      <EmptyState
        title="No sounding matches"
        actions={<Button onClick={props.onClear}>Show all soundings</Button>}
      >
        Change the search or the filters above.
      </EmptyState>
    );
  return (
    <EmptyState title="No soundings yet">
      {props.mayAdd
        ? 'A sounding is one place where a spread was laid out. Add it, then fill in its Field sheet or read in its file.'
        : 'A lead or a geophysicist of the survey adds soundings.'}
    </EmptyState>
  );
}
