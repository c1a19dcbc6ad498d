import { createHash } from 'node:crypto';

/**
 * The id of a thing of the demo, the same in every installation, so that an address that somebody noted leads there again.
 * In the form of UUID version 8, whose content is one's own choice (RFC 9562).
 */
export function stableId(...path: readonly string[]): string {
  const hex = createHash('sha256').update(path.join('/')).digest('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-a${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}
