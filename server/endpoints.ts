import type { Endpoint } from './http/endpoint';

/** Every endpoint of the product, feature by feature; the router, the API page and the access matrix read this list. */
export const endpoints: readonly Endpoint[] = [];
