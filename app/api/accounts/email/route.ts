import { changeEmailForm } from '@/lib/domain/account/forms';
import { askForNewAddress } from '@/lib/server/auth/change-email';
import { throttleLetter } from '@/lib/server/auth/count-tries';
import { route } from '@/lib/server/route';

/** Asks for a change of address; a link goes to the new one, a notice to the old. */
export const PUT = route({ auth: 'member', body: changeEmailForm }, async ({ account, body, request }) => {
  await throttleLetter(request, body.email);
  await askForNewAddress(account, body.email, body.present);
  return { sent: true };
});
