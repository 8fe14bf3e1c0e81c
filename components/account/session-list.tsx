'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { LocalTime } from './local-time';
import { send } from './send';
import { useHydrated } from './use-hydrated';

interface SessionListProps {
  sessions: { id: string; device: string; signedInAt: string; lastSeenAt: string; current: boolean }[];
}

const answer = z.object({ ended: z.number() });

/** Where the account is signed in, with a way to end each sign-in but this one. */
export function SessionList({ sessions }: SessionListProps) {
  const router = useRouter();
  const hydrated = useHydrated();
  const [ending, setEnding] = useState<string | null>(null);
  const [said, setSaid] = useState<{ tone: 'done' | 'danger'; words: string } | null>(null);

  async function end(path: string, which: string, words: string) {
    setEnding(which);
    const result = await send('DELETE', path, answer);
    setEnding(null);
    // One that has ended already is what was wanted.
    const done = result.ok || result.code === 'not-found';
    setSaid(done ? { tone: 'done', words } : { tone: 'danger', words: result.detail });
    router.refresh();
  }

  return (
    <div className="grid gap-4">
      <ul className="border-t border-line">
        {sessions.map(({ id, device, signedInAt, lastSeenAt, current }) => (
          <li
            key={id}
            className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-line py-3"
          >
            <span className="grid">
              <span className="text-lg font-semibold">{device}</span>
              <span className="text-base text-soft">
                {current ? (
                  'This one'
                ) : (
                  <>
                    Last seen <LocalTime at={lastSeenAt} />
                  </>
                )}
                , signed in <LocalTime at={signedInAt} />
              </span>
            </span>
            {!current && (
              <Button
                kind="act"
                disabled={!hydrated}
                pending={ending === id}
                pendingLabel="Signing out"
                aria-label={`Sign out ${device}`}
                onClick={() => end(`/api/accounts/sessions/${id}`, id, `${device} is signed out.`)}
              >
                Sign out
              </Button>
            )}
          </li>
        ))}
      </ul>
      {sessions.length > 1 && (
        <div>
          <Button
            kind="danger"
            disabled={!hydrated}
            pending={ending === 'others'}
            pendingLabel="Signing out"
            onClick={() => end('/api/accounts/sessions', 'others', 'Every other device is signed out.')}
          >
            Sign out all others
          </Button>
        </div>
      )}
      <div aria-live="polite" className="empty:hidden">
        {said && <Notice tone={said.tone}>{said.words}</Notice>}
      </div>
      <p className="text-base text-soft">
        What a phone has not sent yet stays on it when it is signed out, and is sent once you sign in there again.
      </p>
    </div>
  );
}
