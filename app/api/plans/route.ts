import { listPlans } from '@/lib/server/queries/plans';
import { route } from '@/lib/server/route';

export const GET = route({ auth: 'member' }, async ({ account }) => ({ plans: await listPlans(account.id) }));
