import type { ComponentType } from 'react';
import { useSearchParams } from 'react-router-dom';
import { useMe } from '../../api/use-me';
import { PageFrame } from '../../app/page-frame';
import { PageHeader } from '../../ui/page-header';
import { Segmented } from '../../ui/segmented';
import { NoPermissionState } from '../../ui/view-states';
import { AuditEventTable } from './audit-event-table';
import { MailList } from './mail-list';
import { SurveyTable } from './survey-table';
import { UserTable } from './user-table';

const VIEWS = [
  { value: 'users', label: 'People' },
  { value: 'surveys', label: 'Surveys' },
  { value: 'mail', label: 'Mail' },
  { value: 'events', label: 'Audit events' },
] as const;

type View = (typeof VIEWS)[number]['value'];

const BODY: Record<View, ComponentType> = {
  users: UserTable,
  surveys: SurveyTable,
  mail: MailList,
  events: AuditEventTable,
};

export function AdminPage() {
  const me = useMe();
  const [search, setSearch] = useSearchParams();
  const view = VIEWS.find(({ value }) => value === search.get('view'))?.value ?? 'users';
  const Body = BODY[view];
  return (
    <PageFrame title="Administration" crumbs={[{ label: 'Administration' }]}>
      {me.can.administer ? (
        <>
          <PageHeader
            title="Administration"
            actions={
              <Segmented
                label="Part of the administration"
                value={view}
                options={VIEWS}
                onChange={(next) => setSearch({ view: next })}
              />
            }
          />
          <Body />
        </>
      ) : (
        <NoPermissionState>Only an administrator sees this page.</NoPermissionState>
      )}
    </PageFrame>
  );
}
