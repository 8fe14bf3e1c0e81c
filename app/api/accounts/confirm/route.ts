import { confirmForm } from '@/lib/domain/account/forms';
import { confirmAccount } from '@/lib/server/auth/confirm-account';
import { throttleLink } from '@/lib/server/auth/count-tries';
import { route } from '@/lib/server/route';

/** Confirms the address of a new account, by the link's secret and the password. */
export const POST = route({ auth: 'anyone', body: confirmForm }, async ({ body, request }) => {
  await throttleLink(request, body.token);
  return confirmAccount(body.token, body.password);
});
