import { adminEndpoints } from './admin/admin-routes';
import { boreholeEndpoints } from './boreholes/borehole-routes';
import type { Endpoint } from './http/endpoint';
import { interpretationsEndpoints } from './interpretations/interpretations-routes';
import { invitationEndpoints } from './invitations/invitation-routes';
import { lineEndpoints } from './lines/line-routes';
import { memberEndpoints } from './members/member-routes';
import { passwordResetEndpoints } from './password-resets/password-reset-routes';
import { importEndpoints } from './readings/import-routes';
import { readingEndpoints } from './readings/reading-routes';
import { runsEndpoints } from './runs/runs-routes';
import { sessionEndpoints } from './session/session-routes';
import { soundingEndpoints } from './soundings/sounding-routes';
import { surveyEndpoints } from './surveys/survey-routes';

/** Every endpoint of the product, feature by feature; the router, the API page and the access matrix read this list. */
export const endpoints: readonly Endpoint[] = [
  ...sessionEndpoints,
  ...passwordResetEndpoints,
  ...invitationEndpoints,
  ...surveyEndpoints,
  ...memberEndpoints,
  ...lineEndpoints,
  ...boreholeEndpoints,
  ...soundingEndpoints,
  ...readingEndpoints,
  ...importEndpoints,
  ...adminEndpoints,
  ...runsEndpoints,
  ...interpretationsEndpoints,
];
