import { Mark } from '@/components/ui/mark';

/** What stands in the page before the phone's own records are open: the frame and nothing that could be wrong. */
export function BlankBench() {
  return (
    <div className="bench">
      <header className="bench-head">
        <span className="flex items-center gap-2 px-4">
          <Mark size={28} />
          <span className="font-figures text-[1.375rem] font-semibold">Holdfast</span>
        </span>
      </header>
      <main className="bench-main px-4 py-6" aria-busy="true">
        <p className="text-soft">Opening your bench.</p>
      </main>
    </div>
  );
}
