import type { IncomingHttpHeaders } from 'node:http';

/**
 * Whether a writing request can have come from a page of ours. Browsers say where a request comes from (Sec-Fetch-Site, Origin) and
 * scripts on other pages cannot change that; a program that says neither is no browser and carries nobody's cookie by accident.
 * @param publicOrigin Origin under which people reach the service.
 */
export function isSameOrigin(headers: IncomingHttpHeaders, publicOrigin: string): boolean {
  const site = headers['sec-fetch-site'];
  if (site !== undefined && site !== 'same-origin' && site !== 'none') return false;
  const { origin, host } = headers;
  if (origin === undefined || origin === publicOrigin) return true;
  return URL.canParse(origin) && new URL(origin).host === host;
}
