import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { z } from 'zod';
import type { adminSurveySchema } from '../../../server/contract/admin';
import { roleSchema, type Role } from '../../../server/contract/roles';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { QueryView } from '../../app/query-view';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { ROLE_LABELS, ROLE_OPTIONS } from '../../ui/role-words';
import { Select } from '../../ui/select';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { useJoinSurvey } from './admin-mutations';
import { adminSurveysQuery } from './admin-queries';

type AdminSurvey = z.output<typeof adminSurveySchema>;

export function SurveyTable() {
  const surveys = useQuery(adminSurveysQuery);
  const [joining, setJoining] = useState<AdminSurvey | null>(null);
  return (
    <>
      <p className="mb-3 max-w-prose text-muted">
        An administrator sees nothing of a survey before joining it, and joining is written into the audit
        events.
      </p>
      <QueryView query={surveys} loadingLabel="Loading surveys">
        {({ items }) =>
          items.length === 0 ? (
            <p className="text-muted">No survey yet.</p>
          ) : (
            <Table caption="Surveys">
              <TableHead>
                <HeaderCell>Survey</HeaderCell>
                <HeaderCell numeric>Members</HeaderCell>
                <HeaderCell>Your role</HeaderCell>
                <HeaderCell>
                  <span className="sr-only">Actions</span>
                </HeaderCell>
              </TableHead>
              <TableBody>
                {items.map((survey) => (
                  <TableRow key={survey.id}>
                    <Cell>
                      {survey.ownRole === null ? (
                        survey.name
                      ) : (
                        <Link to={addressOf('survey', { surveyId: survey.id })}>{survey.name}</Link>
                      )}
                    </Cell>
                    <Cell numeric>{survey.members}</Cell>
                    <Cell>{survey.ownRole === null ? 'not joined' : ROLE_LABELS[survey.ownRole]}</Cell>
                    <Cell className="text-right">
                      {survey.ownRole === null ? (
                        <Button
                          size="small"
                          aria-label={`Join ${survey.name}`}
                          onClick={() => setJoining(survey)}
                        >
                          Join
                        </Button>
                      ) : null}
                    </Cell>
                  </TableRow>
                ))}
              </TableBody>
            </Table>
          )
        }
      </QueryView>
      {joining ? <JoinDialog survey={joining} onClose={() => setJoining(null)} /> : null}
    </>
  );
}

function JoinDialog({ survey, onClose }: { survey: AdminSurvey; onClose: () => void }) {
  const join = useJoinSurvey();
  const [role, setRole] = useState<Role>('guest');
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Join ${survey.name}`}
      description="Members see who joins, and an audit event is written."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button
            kind="main"
            loading={join.isPending}
            onClick={() => join.mutate({ surveyId: survey.id, role }, { onSuccess: onClose })}
          >
            Join
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-4">
        <FormErrors title="Not joined" faults={formFaults(join.error)} />
        <Field label="Role">
          <Select
            options={ROLE_OPTIONS}
            value={role}
            onChange={(event) => setRole(roleSchema.parse(event.target.value))}
          />
        </Field>
      </div>
    </Dialog>
  );
}
