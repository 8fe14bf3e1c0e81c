import { nameForm } from '@/lib/domain/account/forms';
import { changeName } from '@/lib/server/auth/change-name';
import { route } from '@/lib/server/route';

/** Changes the name that the crew sees. */
export const PUT = route({ auth: 'member', body: nameForm }, async ({ account, body }) =>
  changeName(account.id, body.name),
);
