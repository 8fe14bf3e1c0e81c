'use client';
import { Button } from '@/components/ui/button';

export default function DeskError({ reset }: { reset: () => void }) {
  return (
    <div className="grid justify-items-start gap-4" role="alert">
      <h1 className="text-4xl">This page could not be shown</h1>
      <p className="text-xl">
        Nothing was lost. The server may be out of reach; try again in a minute. The bench needs no server.
      </p>
      <Button onClick={reset}>Try again</Button>
    </div>
  );
}
