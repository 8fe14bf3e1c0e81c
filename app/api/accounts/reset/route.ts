import { resetForm } from '@/lib/domain/account/forms';
import { resetPassword } from '@/lib/server/auth/reset-password';
import { throttleLink } from '@/lib/server/auth/count-tries';
import { route } from '@/lib/server/route';

/** Sets a new password, by the link's secret. */
export const POST = route({ auth: 'anyone', body: resetForm }, async ({ body, request }) => {
  await throttleLink(request, body.token);
  return resetPassword(body.token, body.password);
});
