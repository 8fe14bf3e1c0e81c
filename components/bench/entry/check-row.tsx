'use client';
import { useRef, type ReactNode } from 'react';

interface CheckRowProps {
  checked: boolean;
  onChange: (checked: boolean) => void;
  tone?: 'blue' | 'red' | 'green';
  invalid?: boolean;
  className?: string;
  children: ReactNode;
}

const ACCENTS = { blue: 'accent-blue', red: 'accent-red', green: 'accent-green' } as const;
const DEBOUNCE_MS = 400;

/** A box to tick whose whole row is the target; a second change within 400 ms is a ghost of a wet screen and is passed over. */
export function CheckRow({ checked, onChange, tone = 'blue', invalid, className = '', children }: CheckRowProps) {
  const changedAt = useRef(-Infinity);
  return (
    <label className={`flex min-h-[81px] cursor-pointer items-center gap-4 active:bg-line ${className}`}>
      <input
        type="checkbox"
        className={`size-8 shrink-0 ${ACCENTS[tone]}`}
        checked={checked}
        aria-invalid={invalid || undefined}
        onChange={(event) => {
          if (event.timeStamp - changedAt.current < DEBOUNCE_MS) return;
          changedAt.current = event.timeStamp;
          onChange(event.target.checked);
        }}
      />
      <span>{children}</span>
    </label>
  );
}
