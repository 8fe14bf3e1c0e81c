import { z } from 'zod';

const uuid = z.uuid();
const email = z.string().max(254);

/**
 * A letter asked for, as it waits in the queue. It holds no secret: links are made when the letter is written, after the
 * request that asked has been answered, so that the answer takes as long for an address without an account.
 */
export const letterOrder = z.discriminatedUnion('letter', [
  z.strictObject({ letter: z.literal('confirm-address'), email }),
  z.strictObject({ letter: z.literal('reset-password'), email }),
  z.strictObject({ letter: z.literal('password-changed'), accountId: uuid }),
  z.strictObject({ letter: z.literal('confirm-new-address'), accountId: uuid, email }),
  z.strictObject({ letter: z.literal('new-address-asked'), email, newEmail: email }),
  z.strictObject({ letter: z.literal('address-changed'), email, newEmail: email }),
]);

export type LetterOrder = z.infer<typeof letterOrder>;
