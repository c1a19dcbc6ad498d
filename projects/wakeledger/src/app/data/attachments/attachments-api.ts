import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  type Attachment,
  type AttachmentPurpose,
  attachmentDownload,
  attachmentRead,
  attachmentUpload,
} from '#shared/contracts/attachments';
import { ApiClient } from '../../core/api/api-client';

/** Files beside variants and results. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class AttachmentsApi {
  private readonly api = inject(ApiClient);

  bring(file: File, purpose: AttachmentPurpose): Observable<Attachment> {
    return this.api.call(attachmentUpload, { query: { purpose }, file });
  }

  describe(attachmentId: string): Observable<Attachment> {
    return this.api.call(attachmentRead, { params: { attachmentId } });
  }

  /** Where the file itself lies: for a link or a picture's source. */
  addressOf(attachmentId: string): string {
    return this.api.addressOf(attachmentDownload, { params: { attachmentId } });
  }
}
