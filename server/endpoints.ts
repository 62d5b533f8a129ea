import type { Endpoint } from './http/endpoint';
import { runsEndpoints } from './runs/runs-routes';

/** Every endpoint of the product, feature by feature; the router, the API page and the access matrix read this list. */
export const endpoints: readonly Endpoint[] = [...runsEndpoints];
