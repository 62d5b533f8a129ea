import type { ComponentType } from 'react';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { ROUTE_PATHS, type RouteName } from './addresses';
import { LoadingPage } from './loading-page';
import { NotFoundPage } from './not-found-page';
import { RequireSession } from './require-session';
import { RootLayout } from './root-layout';
import { RouteError } from './route-error';

type PageLoader = () => Promise<ComponentType>;

/**
 * The page of each address, fetched when it is first opened:
 * `bench: async () => (await import('../features/bench/bench-page')).BenchPage`.
 */
const PAGES: Partial<Record<RouteName, PageLoader>> = {
  surveys: async () => (await import('../features/surveys/surveys-page')).SurveysPage,
  survey: async () => (await import('../features/surveys/survey-overview-page')).SurveyOverviewPage,
  surveySoundings: async () => (await import('../features/soundings/soundings-page')).SoundingsPage,
  bench: async () => (await import('../features/bench/bench-page')).BenchPage,
  readings: async () => (await import('../features/readings/field-sheet-page')).FieldSheetPage,
  sideBySide: async () => (await import('../features/side-by-side/side-by-side-page')).SideBySidePage,
  interpretations: async () =>
    (await import('../features/interpretations/interpretations-page')).InterpretationsPage,
  interpretation: async () =>
    (await import('../features/interpretations/interpretation-page')).InterpretationPage,
  surveyBoreholes: async () => (await import('../features/boreholes/boreholes-page')).BoreholesPage,
  surveyMembers: async () => (await import('../features/members/members-page')).MembersPage,
  admin: async () => (await import('../features/admin/admin-page')).AdminPage,
  settings: async () => (await import('../features/account/settings-page')).SettingsPage,
};

/** Pages that are open to a reader who is not signed in. */
const PUBLIC_PAGES: Partial<Record<RouteName, PageLoader>> = {
  signIn: async () => (await import('../features/sign-in/sign-in-page')).SignInPage,
  forgotPassword: async () => (await import('../features/sign-in/forgot-password-page')).ForgotPasswordPage,
  resetPassword: async () => (await import('../features/sign-in/reset-password-page')).ResetPasswordPage,
  invitation: async () => (await import('../features/sign-in/invitation-page')).InvitationPage,
};

const routesOf = (pages: Partial<Record<RouteName, PageLoader>>) =>
  Object.entries(pages).map(([name, load]): RouteObject => {
    const path = ROUTE_PATHS[name as RouteName];
    return { path, lazy: async () => ({ Component: await load() }) };
  });

export const router = createBrowserRouter([
  {
    element: <RootLayout />,
    errorElement: <RouteError />,
    HydrateFallback: LoadingPage,
    children: [
      {
        errorElement: <RouteError />,
        children: [
          ...routesOf(PUBLIC_PAGES),
          { element: <RequireSession />, children: routesOf(PAGES) },
          { path: '*', element: <NotFoundPage /> },
        ],
      },
    ],
  },
]);
