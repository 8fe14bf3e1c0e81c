import { checkHealth } from '@/lib/server/queries/health';
import { route } from '@/lib/server/route';

/** Says that the server and its database answer. */
export const GET = route({ auth: 'anyone' }, checkHealth);
