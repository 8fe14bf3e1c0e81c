import type { Metadata } from 'next';
import Link from 'next/link';
import { SignUpForm } from '@/components/account/sign-up-form';
import { FormPage } from '@/components/site/form-page';
import { linkLook } from '@/components/ui/link-look';

export const metadata: Metadata = { title: 'Sign up' };

export default function SignUpPage() {
  return (
    <FormPage
      title="Sign up"
      otherwise={
        <Link href="/sign-in" className={linkLook.quiet}>
          You have an account? Sign in
        </Link>
      }
    >
      <SignUpForm />
    </FormPage>
  );
}
