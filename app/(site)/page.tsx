import Link from 'next/link';
import { HoldfastDrawing } from '@/components/site/holdfast-drawing';
import { linkLook } from '@/components/ui/link-look';
import { currentAccount } from '@/lib/server/auth/current-account';

export default async function HomePage() {
  const account = await currentAccount();
  return (
    <div className="grid items-start gap-10 md:grid-cols-[3fr_2fr] md:gap-14">
      <div className="grid gap-6">
        <h1 className="text-[40px] sm:text-5xl">From a pile of wood to a square, safe piece, with no signal</h1>
        <p className="text-xl">
          Holdfast holds your place. At the desk you choose a plan and start a build; you take it to the bench, and from
          then on your phone needs nothing but itself. It says what can be done now, what each step wants, what is still
          in clamps and until when, and what each operation can do to hands, lungs and back. What you tick, measure and
          photograph stays in your build log and goes home when there is a signal again.
        </p>
        {account ? (
          <div className="grid gap-4">
            <p className="text-lg text-soft">You are signed in as {account.name}.</p>
            <Link href="/desk" className={linkLook.plate}>
              Go to the desk
            </Link>
          </div>
        ) : (
          <div className="grid gap-4">
            <Link href="/sign-up" className={linkLook.plate}>
              Sign up
            </Link>
            <p className="flex flex-wrap items-center gap-x-3 text-lg">
              You have an account?
              <Link href="/sign-in" className={linkLook.quiet}>
                Sign in
              </Link>
            </p>
          </div>
        )}
        <p className="flex flex-wrap items-center gap-x-3 border-t border-line pt-3 text-lg">
          A build is on this phone already?
          <a href="/bench" className={linkLook.quiet}>
            Open the bench
          </a>
        </p>
      </div>
      <HoldfastDrawing className="w-full max-w-lg" />
    </div>
  );
}
