import type { Response } from 'express';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { Container } from '../container';
import type { Download } from './module';

/** Sends a reply; outside production it is parsed first, so that a contract cannot be broken unnoticed. */
export function sendJson(res: Response, container: Container, endpoint: Endpoint, reply: unknown): void {
  if (container.config.mode !== 'production') {
    const parsed = endpoint.response.safeParse(JSON.parse(JSON.stringify(reply ?? null)));
    if (!parsed.success) {
      throw new Error(
        `${endpoint.method} ${endpoint.path} answers against its contract: ${parsed.error.message}`,
      );
    }
  }
  const version = versionOf(reply);
  if (version !== undefined) res.setHeader('ETag', `"${version}"`);
  res.status(200).json(reply);
}

function versionOf(reply: unknown): number | undefined {
  if (typeof reply !== 'object' || reply === null || !('version' in reply)) return undefined;
  return typeof reply.version === 'number' ? reply.version : undefined;
}

/** A file is always offered for saving and never interpreted as a page of ours. */
export function sendDownload(res: Response, download: Download): void {
  res.attachment(download.fileName);
  res.setHeader('Content-Type', download.mediaType);
  res.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");
  res
    .status(200)
    .send(typeof download.body === 'string' ? Buffer.from(download.body, 'utf8') : download.body);
}
