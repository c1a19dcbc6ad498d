import * as z from 'zod';

// zod probes `new Function` once unless told not to; the content security policy forbids it. This module is imported
// by `common.ts` and `endpoint.ts` before any schema is built.
z.config({ jitless: true });
