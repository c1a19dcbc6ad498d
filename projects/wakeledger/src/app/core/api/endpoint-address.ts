import type { Endpoint } from '#shared/contracts/endpoint';

/** Fills a contract's path: `/api/v1/programmes/:programmeId` and its query. Undefined query fields are left out. */
export function endpointAddress(
  endpoint: Pick<Endpoint, 'path'>,
  params: Readonly<Record<string, unknown>>,
  query: Readonly<Record<string, unknown>>,
): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined || value === '') throw new Error(`The address ${endpoint.path} lacks ${name}.`);
    return encodeURIComponent(String(value));
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value === undefined || value === null) continue;
    for (const item of Array.isArray(value) ? value : [value]) search.append(name, String(item));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}
