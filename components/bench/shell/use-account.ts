'use client';
import { useEffect, useState } from 'react';
import { enterAccount, getCurrentAccount, isSignOutOwed } from '@/lib/store/device-database';

/** What the server last said about who is signed in on this browser. */
export type SignInState = 'asking' | 'signed-in' | 'signed-out' | 'no-signal';

/**
 * Asks the server, when there is one, who is signed in, and opens that account's bench. Without an answer the phone goes
 * on with the account it had: nothing at the bench waits for this.
 */
export function useAccount(): SignInState {
  const [state, setState] = useState<SignInState>('asking');
  useEffect(() => {
    let wanted = true;
    const ask = async () => {
      const answer = await askWhoIsSignedIn();
      if (!wanted) return;
      if (typeof answer === 'object') {
        const current = await getCurrentAccount();
        if (current?.accountId !== answer.accountId || current.name !== answer.name) {
          await enterAccount(answer, Date.now());
        }
      }
      if (wanted) setState(typeof answer === 'object' ? 'signed-in' : answer);
    };
    void ask();
    const again = () => void ask();
    window.addEventListener('online', again);
    window.addEventListener('pageshow', again);
    return () => {
      wanted = false;
      window.removeEventListener('online', again);
      window.removeEventListener('pageshow', again);
    };
  }, []);
  return state;
}

interface Me {
  accountId: string;
  name: string;
  email: string;
}

async function askWhoIsSignedIn(): Promise<Me | 'signed-out' | 'no-signal'> {
  try {
    // Who signed out here with no signal is not let in again by the first one.
    if (await isSignOutOwed()) {
      const { endOwedSignOut } = await import('@/components/account/sign-in-out');
      if ((await endOwedSignOut()) === 'owed') return 'no-signal';
    }
    const response = await fetch('/api/me', { cache: 'no-store', signal: AbortSignal.timeout(8_000) });
    if (response.status === 401) return 'signed-out';
    const body: unknown = await response.json();
    return isMe(body) ? body : 'no-signal';
  } catch {
    // No network, no answer in time, or a sign-in page of a Wi-Fi: none of these says who is here.
    return 'no-signal';
  }
}

function isMe(body: unknown): body is Me {
  const me = body as Partial<Me> | null;
  return [me?.accountId, me?.name, me?.email].every((field) => typeof field === 'string');
}
