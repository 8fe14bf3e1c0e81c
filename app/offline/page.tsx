import type { Metadata } from 'next';
import { linkLook } from '@/components/ui/link-look';
import { Mark } from '@/components/ui/mark';

export const metadata: Metadata = { title: 'No signal' };

/** Shown by the service worker where a page of the desk was asked for with no signal. */
export default function OfflinePage() {
  return (
    <main className="mx-auto grid max-w-xl gap-6 px-5 py-10">
      <Mark size={44} />
      <h1 className="text-4xl">No signal here</h1>
      <p className="text-xl">The desk needs a signal. The bench does not: what you took there is on this phone.</p>
      {/* A plain link: the framework's own would ask the network for a payload first. */}
      <a href="/bench" className={linkLook.plate}>
        Open the bench
      </a>
    </main>
  );
}
