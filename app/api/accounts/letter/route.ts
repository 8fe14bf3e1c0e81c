import { emailForm } from '@/lib/domain/account/forms';
import { throttleLetter } from '@/lib/server/auth/count-tries';
import { orderLetter } from '@/lib/server/jobs/queue';
import { route } from '@/lib/server/route';

/** Sends the letter of a sign-up again; the same answer and the same work whether or not there was one. */
export const POST = route({ auth: 'anyone', body: emailForm }, async ({ body, request }) => {
  await throttleLetter(request, body.email);
  await orderLetter({ letter: 'confirm-address', email: body.email });
  return { sent: true };
});
