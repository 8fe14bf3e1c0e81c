'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useMemo } from 'react';
import { logDays, type LogItem } from '@/lib/domain/build/log-days';
import { sessionsOf } from '@/lib/domain/build/views';
import { getEntries } from '@/lib/store/queries/builds';
import { Button } from '@/components/ui/button';
import { clockTime, dayKey, dayWords, spanWords } from '../entry/time-words';
import { PhotoImage } from '../photos/photo-image';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { BuildFrame } from '../shell/build-frame';
import { useBuild } from '../shell/build-context';
import { ViewHeading } from '../shell/view-heading';

/** The whole log, newest day first, by session; anything can be undone from here, and an undo taken back. */
export function LogView() {
  const { db, formatRead: format } = useBench();
  const { build, plan, state } = useBuild();
  const entries = useLiveQuery(() => getEntries(db, build.id), [db, build.id]);
  const days = useMemo(
    () => (entries ? logDays(entries, plan, dayKey, { formatLength: format }).reverse() : null),
    [entries, plan, format],
  );
  const sessions = new Map(sessionsOf(state).map((session) => [session.sessionId, session]));
  return (
    <BuildFrame>
      <div className="bench-page">
        <ViewHeading focusKey={`log ${build.id}`} over={build.name}>
          Build log
        </ViewHeading>
        {days?.length === 0 && <p>Nothing yet. What you do at the bench is written down here by itself.</p>}
        {days?.map(({ day, sessions: ofDay }) => (
          <section key={day} aria-labelledby={`day-${day}`}>
            <h2 id={`day-${day}`} className="border-b-2 border-iron pb-1 text-[1.5rem]">
              {dayWords(day)}
            </h2>
            {[...ofDay].reverse().map(({ sessionId, items }, index) => {
              const session = sessionId ? sessions.get(sessionId) : undefined;
              return (
                <div key={`${sessionId} ${index}`} className="border-b-2 border-line">
                  {session?.openedAt && (
                    <h3 className="pt-3 text-[1.125rem] font-medium text-soft">
                      Session from {clockTime(session.openedAt)}
                      {session.minutes !== null && `, ${spanWords(session.minutes * 60_000)}`}
                    </h3>
                  )}
                  <ol>
                    {[...items].reverse().map((item) => (
                      <Row key={item.entryId} item={item} />
                    ))}
                  </ol>
                </div>
              );
            })}
          </section>
        ))}
      </div>
    </BuildFrame>
  );
}

function Row({ item }: { item: LogItem }) {
  const { build, readOnly } = useBuild();
  const { act } = useActs();
  const who = build.crew.find(({ accountId }) => accountId === item.accountId)?.name;
  return (
    <li className="grid grid-cols-[4.2rem_1fr_auto] items-start gap-x-2 border-b border-line py-2 last:border-0">
      <span className="figures pt-1 text-[1.0625rem] text-soft">{clockTime(item.at)}</span>
      <div className={item.undone ? 'text-soft line-through' : ''}>
        <p className="line-clamp-6 break-words whitespace-pre-line">{item.words}</p>
        <p className="text-[1rem] text-soft">
          {[build.crew.length > 1 && who, item.held && 'held here', item.undone && 'undone']
            .filter(Boolean)
            .join(' · ')}
        </p>
        {item.photo && !item.undone && (
          <div className="mt-1 max-w-56">
            <PhotoImage sha256={item.photo} alt={item.words} />
          </div>
        )}
      </div>
      {item.undoable && !readOnly && (
        <Button
          kind="plain"
          className="text-blue!"
          aria-label={`${item.undone ? 'Put back' : 'Undo'}: ${item.words.slice(0, 80)}`}
          onClick={() =>
            void act(`${item.undone ? 'Put back' : 'Undone'}: ${item.words}`, async (acts, db) => {
              const result = await acts.undoEntry(db, {
                buildId: build.id,
                entryId: item.entryId,
                undone: !item.undone,
              });
              // The undo can itself be taken back in this row; the bar at the foot keeps to acts.
              return result.ok ? [] : result;
            })
          }
        >
          {item.undone ? 'Put back' : 'Undo'}
        </Button>
      )}
    </li>
  );
}
