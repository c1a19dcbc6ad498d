import './zod-setup';
import * as z from 'zod';

export const nothing = z.strictObject({});

export const id = z.uuid();
export const version = z.int().min(1).describe('Rises with every change; send it back in If-Match.');
export const isoDate = z.iso.date();
export const timestamp = z.iso.datetime({ offset: true });

export const name = z.string().trim().min(1).max(120);
export const remark = z.string().trim().max(4000);

/** Finite by construction: zod's number refuses NaN and infinities. */
export const finite = z.number();
export const positive = z.number().positive();
export const notNegative = z.number().min(0);
export const fraction = z.number().min(0).max(1);

/** Degrees of freedom; absent means infinite. */
export const degreesOfFreedom = z.number().positive();

export const organisationParams = z.strictObject({ organisationId: id });
export const programmeParams = z.strictObject({ programmeId: id });
export const variantParams = z.strictObject({ programmeId: id, variantId: id });
