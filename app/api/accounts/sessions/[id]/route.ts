import { z } from 'zod';
import { revokeSession } from '@/lib/server/auth/sessions';
import { AppError } from '@/lib/server/errors';
import { route } from '@/lib/server/route';

/** Ends one sign-in of this account. */
export const DELETE = route(
  { auth: 'member', params: z.object({ id: z.uuid() }) },
  async ({ account, params: { id } }) => {
    if (await revokeSession(account.id, id)) return { ended: 1 };
    throw new AppError('not-found', 'That sign-in has ended already.');
  },
);
