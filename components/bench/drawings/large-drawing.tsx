'use client';
import { useEffect, useRef, useState } from 'react';
import { Button } from '@/components/ui/button';

/** Widths offered, as parts of the screen's. */
const SIZES = [1, 1.5, 2, 3, 4] as const;

interface LargeDrawingProps {
  title: string;
  address: string;
  onClose: () => void;
}

/** A drawing over the whole screen. It is moved by scrolling and sized by buttons, so that no pinch is needed. */
export function LargeDrawing({ title, address, onClose }: LargeDrawingProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [size, setSize] = useState(1);
  useEffect(() => dialog.current?.showModal(), []);
  return (
    <dialog
      ref={dialog}
      onClose={onClose}
      aria-label={title}
      className="m-0 h-dvh max-h-none w-dvw max-w-none flex-col bg-paper text-iron open:flex"
    >
      {/* Focusable, so that arrow keys move the drawing. */}
      <div tabIndex={0} role="group" aria-label={`${title}, scroll to move it`} className="grow overflow-auto bg-white">
        {/* eslint-disable-next-line @next/next/no-img-element */}
        <img src={address} alt={title} className="max-w-none" style={{ width: `${SIZES[size - 1]! * 100}%` }} />
      </div>
      <div className="grid grid-cols-3 gap-4 border-t-2 border-iron p-3">
        <Button kind="quiet" disabled={size === 1} onClick={() => setSize(size - 1)}>
          Smaller
        </Button>
        <Button kind="quiet" disabled={size === SIZES.length} onClick={() => setSize(size + 1)}>
          Larger
        </Button>
        <Button autoFocus onClick={() => dialog.current?.close()}>
          Close
        </Button>
      </div>
    </dialog>
  );
}
