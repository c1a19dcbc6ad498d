/** The programme's id in an address below `/programmes/`; `new` is the page that opens one. */
export function programmeIdIn(address: string): string | undefined {
  const id = /^\/programmes\/([^/?#]+)/.exec(address)?.[1];
  return id === 'new' ? undefined : id;
}
