import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { SignInForm } from '@/components/account/sign-in-form';
import { FormPage } from '@/components/site/form-page';
import { linkLook } from '@/components/ui/link-look';
import { safeReturn } from '@/lib/domain/account/safe-return';
import { currentAccount } from '@/lib/server/auth/current-account';

export const metadata: Metadata = { title: 'Sign in' };

interface SignInPageProps {
  /** `return`: where the person was. */
  searchParams: Promise<{ return?: string | string[] }>;
}

export default async function SignInPage({ searchParams }: SignInPageProps) {
  const { return: asked } = await searchParams;
  const back = safeReturn(typeof asked === 'string' ? asked : null, '/desk');
  if (await currentAccount()) redirect(back);
  return (
    <FormPage
      title="Sign in"
      otherwise={
        <>
          <Link href="/forgotten" className={linkLook.quiet}>
            Forgotten password
          </Link>
          <Link href="/sign-up" className={linkLook.quiet}>
            Sign up
          </Link>
        </>
      }
    >
      <SignInForm next={back} />
    </FormPage>
  );
}
