'use client';
import { Component, type ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Mark } from '@/components/ui/mark';
import { Notice } from '@/components/ui/notice';

interface StorageFaultProps {
  children: ReactNode;
}

/** Stands in for the bench when the phone's storage cannot be opened or fails, and says so in words. */
export class StorageFault extends Component<StorageFaultProps, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: unknown) {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  override render() {
    const { error } = this.state;
    if (!error) return this.props.children;
    const inWords =
      error.name === 'StorageProblem'
        ? error.message
        : `Holdfast could not read this phone’s records (${error.message}). What was saved is still there. Open the bench again; if it stays so, close other tabs of Holdfast and restart the browser.`;
    return (
      <div className="bench">
        <header className="bench-head">
          <span className="flex items-center gap-2 px-4">
            <Mark size={28} />
            <span className="font-figures text-[1.375rem] font-semibold">Holdfast</span>
          </span>
        </header>
        <main className="bench-main">
          <div className="bench-page">
            <h1 className="text-[2.25rem]">The bench did not open</h1>
            <Notice tone="danger" live="alert">
              {inWords}
            </Notice>
            <Button kind="plate" onClick={() => window.location.reload()}>
              Open again
            </Button>
          </div>
        </main>
      </div>
    );
  }
}
