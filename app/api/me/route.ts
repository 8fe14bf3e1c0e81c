import { route } from '@/lib/server/route';

/** Who is signed in here, for the bench to know whose records it holds. */
export const GET = route({ auth: 'member' }, async ({ account }) => ({
  accountId: account.id,
  name: account.name,
  email: account.email,
}));
