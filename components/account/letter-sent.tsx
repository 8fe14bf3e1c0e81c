'use client';
import { useState } from 'react';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Outcome } from './outcome';
import { send } from './send';

const answer = z.object({ sent: z.literal(true) });

/** After a sign-up: what to do now, and how to get the letter again. Says the same whether or not there was an account. */
export function LetterSent({ email }: { email: string }) {
  const [again, setAgain] = useState<'no' | 'sending' | 'sent' | { failed: string }>('no');

  async function sendAgain() {
    setAgain('sending');
    const result = await send('POST', '/api/accounts/letter', answer, { email });
    setAgain(result.ok ? 'sent' : { failed: result.detail });
  }

  return (
    <Outcome title="Now look in your mail">
      <p>
        A letter is on its way to <strong className="break-words">{email}</strong>. Open the link in it within 48 hours,
        with the password that you have just chosen at hand.
      </p>
      <p className="text-soft">Nothing there after a few minutes? Look among the spam, or have it sent again.</p>
      <div>
        <Button pending={again === 'sending'} pendingLabel="Sending" onClick={sendAgain}>
          Send it again
        </Button>
      </div>
      <p aria-live="polite" className="empty:hidden">
        {again === 'sent' && 'Another letter is on its way.'}
        {typeof again === 'object' && again.failed}
      </p>
    </Outcome>
  );
}
