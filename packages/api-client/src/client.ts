import createFetchClient, { type Client } from 'openapi-fetch';
import type { paths } from './schema.js';

export type ApiClient = Client<paths>;

/**
 * The API as a typed client.
 * @param origin scheme, host and port of the server; absolute, for a relative address has no meaning outside a page
 * @param fetchIt how requests are sent; the platform's own fetch where left out
 */
export function createApiClient(
  origin: string,
  fetchIt?: (request: Request) => Promise<Response>,
): ApiClient {
  return createFetchClient<paths>({
    baseUrl: new URL('/api', origin).href,
    ...(fetchIt ? { fetch: fetchIt } : {}),
  });
}
