'use client';
import type { FormEventHandler, ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { Failure } from './send';

interface AccountFormProps {
  onSubmit: FormEventHandler<HTMLFormElement>;
  failure: Failure | null;
  /** What the button does, in two or three words. */
  action: string;
  /** The same while it runs. */
  running: string;
  press: { disabled: boolean; pending: boolean };
  /** `plate` where this form is what the page is for. */
  weight?: 'plate' | 'act';
  /** Shown with a failure: where to go from there. */
  help?: ReactNode;
  /** How it went well, for a form that stays. */
  done?: ReactNode;
  children: ReactNode;
}

/**
 * Fields, a place where the outcome is announced, and the button. It posts, so that a press before scripts run puts
 * nothing into the address.
 */
export function AccountForm({
  onSubmit,
  failure,
  action,
  running,
  press,
  weight = 'plate',
  help,
  done,
  children,
}: AccountFormProps) {
  return (
    <form method="post" noValidate onSubmit={onSubmit} className="grid gap-5">
      {children}
      <div aria-live="polite" className="empty:hidden">
        {failure && (
          <Notice tone="info" title="Not done.">
            {failure.detail}
            {help && <div className="mt-2">{help}</div>}
          </Notice>
        )}
        {!failure && done && <Notice tone="done">{done}</Notice>}
      </div>
      <div>
        <Button
          type="submit"
          kind={weight}
          className={weight === 'plate' ? 'min-h-20! text-[28px]!' : ''}
          pendingLabel={running}
          {...press}
        >
          {action}
        </Button>
      </div>
    </form>
  );
}
