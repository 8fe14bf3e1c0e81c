import { changePasswordForm } from '@/lib/domain/account/forms';
import { changePassword } from '@/lib/server/auth/change-password';
import { route } from '@/lib/server/route';

/** Changes the password, by the present one; every other sign-in ends. */
export const PUT = route({ auth: 'member', body: changePasswordForm }, async ({ account, session, body }) => {
  await changePassword({ account, session }, body.present, body.password);
  return { changed: true };
});
