'use client';
import { useRef, type ButtonHTMLAttributes, type MouseEvent } from 'react';

/**
 * `plate`: the act of the moment, one to a screen. `act`: an outlined act. `plain`: a word in a row of words.
 * `danger`: an act that can hurt or cannot be undone.
 */
type ButtonKind = 'plate' | 'act' | 'plain' | 'quiet' | 'danger';

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind;
  /** Shown and announced in place of the children while the act runs; also stops a second press. */
  pendingLabel?: string;
  pending?: boolean;
  /** Ignores a second press of this button within so many ms: a wet screen repeats touches. */
  debounceMs?: number;
}

const looks: Record<ButtonKind, string> = {
  plate:
    'min-h-32 w-full rounded-plate bg-blue px-4 py-3 text-[34px] leading-tight font-semibold text-on-blue active:brightness-90',
  act: 'min-h-[52px] rounded-plate border-2 border-iron bg-paper px-5 py-2 text-lg font-semibold text-iron active:bg-line',
  plain: 'min-h-[64px] px-3 py-2 text-lg font-medium text-iron active:bg-line',
  quiet: 'min-h-11 px-2 py-1 text-lg font-medium text-blue underline underline-offset-4 active:bg-line',
  danger:
    'min-h-[52px] rounded-plate border-2 border-red bg-paper px-5 py-2 text-lg font-semibold text-red active:bg-line',
};

export function Button({
  kind = 'act',
  pending = false,
  pendingLabel,
  debounceMs = 400,
  className = '',
  disabled,
  onClick,
  children,
  type = 'button',
  ...rest
}: ButtonProps) {
  const pressedAt = useRef(-Infinity);

  function press(event: MouseEvent<HTMLButtonElement>) {
    if (event.timeStamp - pressedAt.current < debounceMs) {
      event.preventDefault();
      return;
    }
    pressedAt.current = event.timeStamp;
    onClick?.(event);
  }

  return (
    <button
      {...rest}
      type={type}
      disabled={disabled || pending}
      aria-busy={pending || undefined}
      onClick={press}
      className={`font-figures select-none disabled:cursor-not-allowed disabled:opacity-60 ${looks[kind]} ${className}`}
    >
      {pending && pendingLabel ? pendingLabel : children}
    </button>
  );
}
