'use client';
import { Button } from '@/components/ui/button';
import { useActs } from './act-context';

/** What was done last, and its undo: it stays until the next act. A fault takes its place until it is read. */
export function UndoBar() {
  const { last, undoLast, fault, dismissFault } = useActs();
  if (fault) {
    return (
      <div role="alert" className="flex items-center gap-3 border-t-2 border-red bg-paper px-4 py-2">
        <p className="grow text-[1.125rem] font-semibold text-red">{fault}</p>
        <Button kind="plain" className="shrink-0" onClick={dismissFault}>
          Read
        </Button>
      </div>
    );
  }
  if (!last) {
    // Its room is kept, so that the plate does not move from under the thumb at the first act.
    return (
      <p className="flex min-h-[64px] items-center border-t border-line bg-paper px-4 text-[1.0625rem] text-soft">
        Nothing to undo yet.
      </p>
    );
  }
  return (
    <Button
      kind="plain"
      className="flex w-full items-center gap-3 border-t border-line bg-paper px-4 text-left"
      onClick={() => void undoLast()}
    >
      <span className="line-clamp-2 grow text-[1.0625rem] leading-tight text-soft">
        {last.undone ? 'Undone: ' : ''}
        {last.words}
      </span>
      <span className="shrink-0 text-[1.25rem] font-semibold text-blue">{last.undone ? 'Put back' : 'Undo'}</span>
    </Button>
  );
}
