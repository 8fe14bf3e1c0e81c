import type { ReactNode } from 'react';

/** `info` tells, `wait` is about something curing or held, `danger` can hurt or lose, `done` is finished. */
type NoticeTone = 'info' | 'wait' | 'danger' | 'done';

const looks: Record<NoticeTone, string> = {
  info: 'border-iron bg-paper',
  wait: 'border-amber bg-amber-ground text-on-amber',
  danger: 'border-red border-l-[12px] bg-paper',
  done: 'border-green bg-paper',
};

interface NoticeProps {
  tone: NoticeTone;
  /** Said first, in the tone's colour. */
  title?: string;
  /** Announce when it appears: `status` waits its turn, `alert` interrupts. */
  live?: 'status' | 'alert';
  children?: ReactNode;
}

export function Notice({ tone, title, live, children }: NoticeProps) {
  const titleColour = tone === 'danger' ? 'text-red' : tone === 'done' ? 'text-green' : '';
  return (
    <div role={live} className={`rounded-[3px] border-2 px-4 py-3 text-lg ${looks[tone]}`}>
      {title && <strong className={`font-figures text-xl font-semibold ${titleColour}`}>{title} </strong>}
      {children}
    </div>
  );
}
