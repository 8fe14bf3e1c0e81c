import type { Metadata } from 'next';
import Link from 'next/link';
import { ForgottenForm } from '@/components/account/forgotten-form';
import { FormPage } from '@/components/site/form-page';
import { linkLook } from '@/components/ui/link-look';

export const metadata: Metadata = { title: 'Forgotten password' };

export default function ForgottenPage() {
  return (
    <FormPage
      title="Forgotten password"
      otherwise={
        <Link href="/sign-in" className={linkLook.quiet}>
          Back to sign in
        </Link>
      }
    >
      <ForgottenForm />
    </FormPage>
  );
}
