import { listSessions, revokeSessions } from '@/lib/server/auth/sessions';
import { route } from '@/lib/server/route';

/** Every sign-in of this account. */
export const GET = route({ auth: 'member' }, async ({ account, session }) => ({
  sessions: await listSessions(account.id, session.id),
}));

/** Ends every sign-in but this one. */
export const DELETE = route({ auth: 'member' }, async ({ account, session }) => ({
  ended: await revokeSessions(account.id, { except: session.id }),
}));
