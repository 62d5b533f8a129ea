/**
 * Every address of the product. `ROUTE_PATHS` is what the router matches; `addressOf` builds a link.
 * A page's component lives in `src/features/<feature>/<name>-page.tsx` and is registered in `router.tsx`.
 */
export const ROUTE_PATHS = {
  signIn: '/sign-in',
  invitation: '/invitations/:token',
  forgotPassword: '/forgot-password',
  resetPassword: '/reset-password/:token',
  surveys: '/',
  survey: '/surveys/:surveyId',
  surveySoundings: '/surveys/:surveyId/soundings',
  surveyBoreholes: '/surveys/:surveyId/boreholes',
  surveyMembers: '/surveys/:surveyId/members',
  readings: '/soundings/:soundingId/readings',
  bench: '/soundings/:soundingId/bench',
  sideBySide: '/soundings/:soundingId/side-by-side',
  interpretations: '/soundings/:soundingId/interpretations',
  interpretation: '/soundings/:soundingId/interpretations/:interpretationId',
  settings: '/settings',
  admin: '/admin',
} as const;

export type RouteName = keyof typeof ROUTE_PATHS;

type ParamNames<Path extends string> = Path extends `${string}:${infer Name}/${infer Rest}`
  ? Name | ParamNames<`/${Rest}`>
  : Path extends `${string}:${infer Name}`
    ? Name
    : never;

type RouteParams<Name extends RouteName> = Record<ParamNames<(typeof ROUTE_PATHS)[Name]>, string>;

/** `addressOf('bench', { soundingId })` → "/soundings/…/bench". */
export function addressOf<Name extends RouteName>(
  name: Name,
  ...[params]: ParamNames<(typeof ROUTE_PATHS)[Name]> extends never ? [] : [RouteParams<Name>]
): string {
  const values: Record<string, string> = params ?? {};
  return ROUTE_PATHS[name].replace(/:(\w+)/g, (_, key: string) => encodeURIComponent(values[key] ?? ''));
}
