import { z } from 'zod';

export const ownSittingInput = z.strictObject({ sittingId: z.uuid('This address is not complete.') });

export const noInput = z.strictObject({});
