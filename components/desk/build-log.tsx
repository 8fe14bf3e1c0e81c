'use client';
import { useSyncExternalStore } from 'react';
import { LocalTime } from '@/components/account/local-time';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { logDays, type LogItem } from '@/lib/domain/build/log-days';
import { formatLength } from '@/lib/domain/measure';
import type { PlanDocument } from '@/lib/domain/plan/document';
import { LogPhoto } from './log-photo';

const never = () => () => undefined;

/** Days are those of whoever looks; until scripts run they are those of UTC. */
function useDayOf(): (ms: number) => string {
  const zone = useSyncExternalStore(
    never,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => 'UTC',
  );
  const format = new Intl.DateTimeFormat('en', { dateStyle: 'full', timeZone: zone });
  return (ms) => format.format(ms);
}

interface BuildLogProps {
  buildId: string;
  entries: StandingEntry[];
  plan: PlanDocument;
  names: Record<string, string>;
}

/** The log by day and session, with photos; what was undone is struck through and stays. */
export function BuildLog({ buildId, entries, plan, names }: BuildLogProps) {
  const dayOf = useDayOf();
  const days = logDays(entries, plan, dayOf, {
    formatLength: (length) =>
      formatLength(
        length,
        plan.units === 'imperial'
          ? { system: 'imperial', denominator: 64 }
          : { system: 'metric', unit: 'mm', decimals: 1 },
      ),
  });
  if (days.length === 0) {
    return (
      <p className="text-lg">Nothing yet. Take the build to the bench; what is done there comes here by itself.</p>
    );
  }
  return (
    <div className="grid grid-cols-1 gap-8">
      {days.reverse().map(({ day, sessions }) => (
        <section key={day} className="grid grid-cols-1 gap-3">
          <h3 className="text-xl">{day}</h3>
          {sessions.map(({ sessionId, items }, i) => (
            <ol key={sessionId ?? i} className="grid grid-cols-1 border-l-2 border-iron pl-4">
              {items.map((item) => (
                <LogLine key={item.entryId} item={item} buildId={buildId} name={names[item.accountId]} />
              ))}
            </ol>
          ))}
        </section>
      ))}
    </div>
  );
}

function LogLine({ item, buildId, name }: { item: LogItem; buildId: string; name: string | undefined }) {
  return (
    <li className="grid min-w-0 grid-cols-1 gap-1 border-b border-line py-2">
      <p className={`text-lg wrap-anywhere whitespace-pre-wrap ${item.undone ? 'text-soft line-through' : ''}`}>
        {item.words}
      </p>
      {item.photo && <LogPhoto buildId={buildId} sha256={item.photo} words={item.words} />}
      <p className="text-base text-soft">
        <LocalTime at={new Date(item.at).toISOString()} show="time" />
        {name && ` · ${name}`}
        {item.undone && ' · undone'}
      </p>
    </li>
  );
}
