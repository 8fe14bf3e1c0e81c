import { confirmEmailForm } from '@/lib/domain/account/forms';
import { confirmNewAddress } from '@/lib/server/auth/change-email';
import { throttleLink } from '@/lib/server/auth/count-tries';
import { route } from '@/lib/server/route';

/** Takes a new address, by the secret of the link that was sent to it. */
export const POST = route({ auth: 'anyone', body: confirmEmailForm }, async ({ body, request }) => {
  await throttleLink(request, body.token);
  return confirmNewAddress(body.token);
});
