import { emailForm } from '@/lib/domain/account/forms';
import { throttleLetter } from '@/lib/server/auth/count-tries';
import { orderLetter } from '@/lib/server/jobs/queue';
import { route } from '@/lib/server/route';

/** Sends a link for a new password; the same answer and the same work whether or not there is such an account. */
export const POST = route({ auth: 'anyone', body: emailForm }, async ({ body, request }) => {
  await throttleLetter(request, body.email);
  await orderLetter({ letter: 'reset-password', email: body.email });
  return { sent: true };
});
