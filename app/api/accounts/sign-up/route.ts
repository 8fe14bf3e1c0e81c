import { signUpForm } from '@/lib/domain/account/forms';
import { signUp } from '@/lib/server/auth/sign-up';
import { throttleLetter } from '@/lib/server/auth/count-tries';
import { route } from '@/lib/server/route';

/** Opens an account; the same answer where the address has one. */
export const POST = route({ auth: 'anyone', body: signUpForm }, async ({ body, request }) => {
  await throttleLetter(request, body.email);
  await signUp(body);
  return { sent: true };
});
