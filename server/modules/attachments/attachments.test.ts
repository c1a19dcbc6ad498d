import { createHash } from 'node:crypto';
import {
  ATTACHMENT_LIMIT_BYTES,
  attachmentDownload,
  attachmentRead,
  attachmentUpload,
} from '#shared/contracts/attachments';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const PNG = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0]);
const PDF = Buffer.from('%PDF-1.7\n%%EOF\n');
const UNKNOWN = '00000000-0000-4000-8000-000000000000';

describe('attachments over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  const bringIn = (purpose: string, name: string, content: Buffer | string) =>
    aerodynamicist.ok(attachmentUpload, { query: { purpose }, file: { name, content } });

  it('are kept byte for byte, known by size and hash, and typed by their content', async () => {
    const attachment = await bringIn('evidence', 'protocol.txt', PDF);
    expect(attachment).toMatchObject({
      purpose: 'evidence',
      fileName: 'protocol.txt',
      mediaType: 'application/pdf',
      sizeBytes: PDF.length,
      sha256: createHash('sha256').update(PDF).digest('hex'),
    });
    const params = { attachmentId: attachment.id };
    expect(await aerodynamicist.ok(attachmentRead, { params })).toEqual(attachment);
    const file = await aerodynamicist.call(attachmentDownload, { params });
    expect(Buffer.from(file.body as Buffer).equals(PDF)).toBe(true);
  });

  it('leave as files to save, never as pages of ours', async () => {
    const { id } = await bringIn('picture', 'Räder "vorn".png', PNG);
    const { headers } = await aerodynamicist.call(attachmentDownload, { params: { attachmentId: id } });
    expect(headers['content-disposition']).toMatch(/^attachment; filename=/);
    expect(headers['content-type']).toBe('image/png');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['content-security-policy']).toContain('sandbox');
    expect(headers['cache-control']).toContain('no-store');
  });

  it('are refused when they are programs under another name, in words', async () => {
    const problem = await aerodynamicist.refused(attachmentUpload, {
      query: { purpose: 'picture' },
      file: { name: 'side-view.png', content: Buffer.from([0x4d, 0x5a, 0x90, 0x00, 0x03]) },
    });
    expect(problem).toMatchObject({ code: 'unsupported-file', status: 415, where: 'file' });
    expect(problem.detail).toContain('Windows program');
  });

  it('are refused beyond 10 MB, and taken up to it', async () => {
    const large = Buffer.alloc(ATTACHMENT_LIMIT_BYTES + 1, 0x20);
    const upload = (content: Buffer) =>
      aerodynamicist.call(attachmentUpload, {
        query: { purpose: 'evidence' },
        file: { name: 'values.txt', content },
      });
    expect((await upload(large)).status).toBe(413);
    expect((await upload(large.subarray(1))).status).toBe(200);
  });

  it('say what they are for', async () => {
    const file = { name: 'a.png', content: PNG };
    expect((await aerodynamicist.refused(attachmentUpload, { file })).code).toBe('malformed-input');
    expect((await aerodynamicist.refused(attachmentUpload, { query: { purpose: 'other' }, file })).code).toBe(
      'malformed-input',
    );
  });

  it('are read by those who may read what they belong to', async () => {
    const picture = { attachmentId: (await bringIn('picture', 'a.png', PNG)).id };
    const evidence = { attachmentId: (await bringIn('evidence', 'a.png', PNG)).id };
    const stylist = await api.asMember('stylist');
    expect(await stylist.ok(attachmentRead, { params: picture })).toHaveProperty('purpose', 'picture');
    expect((await stylist.call(attachmentDownload, { params: picture })).status).toBe(200);
    expect((await stylist.refused(attachmentRead, { params: evidence })).code).toBe('forbidden');
    expect((await stylist.refused(attachmentDownload, { params: evidence })).code).toBe('forbidden');
    const manager = await api.asMember('programme-manager');
    expect(await manager.ok(attachmentRead, { params: evidence })).toHaveProperty('purpose', 'evidence');
  });

  it('are brought in by those who edit variants or enter results', async () => {
    const upload = { query: { purpose: 'picture' }, file: { name: 'a.png', content: PNG } };
    const manager = await api.asMember('programme-manager');
    expect(await manager.ok(attachmentUpload, upload)).toHaveProperty('id');
    for (const role of ['stylist', 'viewer', 'administrator'] as const) {
      expect((await (await api.asMember(role)).refused(attachmentUpload, upload)).code).toBe('forbidden');
    }
  });

  it('of another organisation answer like unknown ones', async () => {
    const { id } = await bringIn('picture', 'a.png', PNG);
    const stranger = await api.asMember('aerodynamicist', api.second);
    for (const endpoint of [attachmentRead, attachmentDownload]) {
      const [foreign, unknown] = await Promise.all(
        [id, UNKNOWN].map(async (attachmentId) => {
          const { requestId: _requestId, ...rest } = await stranger.refused(endpoint, {
            params: { attachmentId },
          });
          return rest;
        }),
      );
      expect(foreign).toEqual(unknown);
      expect(foreign?.code).toBe('not-found');
    }
  });
});
