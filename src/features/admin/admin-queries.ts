import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import {
  adminSurveyListSchema,
  adminUserListSchema,
  auditEventPageSchema,
  receivedMailPageSchema,
} from '../../../server/contract/admin';
import { getJson, queryText } from '../../api/http';

export const ADMIN_PAGE_SIZE = 50;

export const adminKeys = {
  all: ['admin'] as const,
  users: () => [...adminKeys.all, 'users'] as const,
  surveys: () => [...adminKeys.all, 'surveys'] as const,
  mail: (page: number) => [...adminKeys.all, 'mail', page] as const,
  events: (page: number) => [...adminKeys.all, 'events', page] as const,
};

export const adminUsersQuery = queryOptions({
  queryKey: adminKeys.users(),
  queryFn: ({ signal }) => getJson('/admin/users', adminUserListSchema, { signal }),
});

export const adminSurveysQuery = queryOptions({
  queryKey: adminKeys.surveys(),
  queryFn: ({ signal }) => getJson('/admin/surveys', adminSurveyListSchema, { signal }),
});

export const mailQuery = (page: number) =>
  queryOptions({
    queryKey: adminKeys.mail(page),
    queryFn: ({ signal }) =>
      getJson(`/admin/mail${queryText({ page, pageSize: ADMIN_PAGE_SIZE })}`, receivedMailPageSchema, {
        signal,
      }),
    placeholderData: keepPreviousData,
  });

export const auditEventsQuery = (page: number) =>
  queryOptions({
    queryKey: adminKeys.events(page),
    queryFn: ({ signal }) =>
      getJson(`/admin/audit-events${queryText({ page, pageSize: ADMIN_PAGE_SIZE })}`, auditEventPageSchema, {
        signal,
      }),
    placeholderData: keepPreviousData,
  });
