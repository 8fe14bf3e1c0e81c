'use client';
import { BlankBench } from './blank-bench';
import type { SignInState } from './use-account';
import { Mark } from '@/components/ui/mark';
import { linkLook } from '@/components/ui/link-look';
import { Notice } from '@/components/ui/notice';

/** The bench on a phone that nobody has used yet: what to do first, and why it needs a signal once. */
export function SignedOutBench({ state }: { state: SignInState }) {
  if (state === 'asking' || state === 'signed-in') return <BlankBench />;
  return (
    <div className="bench">
      <header className="bench-head">
        <span className="flex items-center gap-2 px-4">
          <Mark size={28} />
          <span className="font-figures text-[1.375rem] font-semibold">Holdfast</span>
        </span>
      </header>
      <main className="bench-main">
        <div className="bench-page">
          <h1 className="text-[2.25rem]">Nobody is signed in on this phone</h1>
          <p>
            Sign in once, where there is a signal, and take a build to the bench. From then on the bench needs no
            signal: everything is kept on the phone first.
          </p>
          {state === 'no-signal' && (
            <Notice tone="wait" title="No signal.">
              The server gave no answer. Go where there is a signal, then sign in.
            </Notice>
          )}
          <a className={linkLook.plate} href="/sign-in?return=%2Fbench">
            Sign in
          </a>
        </div>
      </main>
    </div>
  );
}
