import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Survey } from '../../../server/contract/surveys';
import { QueryView } from '../../app/query-view';
import { SurveyFrame } from '../../app/survey-frame';
import { Button } from '../../ui/button';
import { formatCount } from '../../ui/format';
import { PageHeader } from '../../ui/page-header';
import { ROLE_LABELS, ROLE_NOTES } from '../../ui/role-words';
import type { Role } from '../../../server/contract/roles';
import { InvitationTable } from './invitation-table';
import { InviteDialog } from './invite-dialog';
import { memberListQuery } from './member-queries';
import { MemberTable } from './member-table';

export function MembersPage() {
  return <SurveyFrame section="Members">{(survey) => <Members survey={survey} />}</SurveyFrame>;
}

function Members({ survey }: { survey: Survey }) {
  const members = useQuery(memberListQuery(survey.id));
  const [inviting, setInviting] = useState(false);
  const mayManage = survey.can.manageMembers;
  return (
    <>
      <PageHeader
        title="Members"
        note={members.data ? formatCount(members.data.items.length, 'member') : undefined}
        actions={
          mayManage ? (
            <Button kind="main" onClick={() => setInviting(true)}>
              Invite
            </Button>
          ) : null
        }
      />
      <div className="grid items-start gap-x-12 gap-y-8 xl:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="flex min-w-0 flex-col gap-10">
          <QueryView query={members} loadingLabel="Loading members">
            {({ items }) => <MemberTable survey={survey} members={items} />}
          </QueryView>
          {mayManage ? <InvitationTable surveyId={survey.id} /> : null}
        </div>
        <RoleKey />
      </div>
      {inviting ? <InviteDialog survey={survey} onClose={() => setInviting(false)} /> : null}
    </>
  );
}

function RoleKey() {
  return (
    <aside aria-label="What each role does" className="border-t border-rule pt-3">
      <h2 className="mb-2 font-semibold">What each role does</h2>
      <dl className="flex flex-col gap-2">
        {(Object.keys(ROLE_LABELS) as Role[]).map((role) => (
          <div key={role}>
            <dt className="font-semibold">{ROLE_LABELS[role]}</dt>
            <dd className="text-muted">{ROLE_NOTES[role]}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 text-sm text-muted">
        A hydrogeologist accepts interpretations; nobody accepts one they wrote or submitted, or whose run
        they asked for.
      </p>
    </aside>
  );
}
