import type { GlueWindows } from '@/lib/domain/glue/windows';
import { minutesWords } from '../entry/time-words';
import { Working } from '../entry/working';

const CONFIDENCE = {
  read: 'read in the source',
  memory: 'recalled, not looked up: the label decides',
  label: 'from the label',
} as const;

/** The working of the glue times: range, formula, inputs, source and how sure it is. */
export function GlueWorking({ windows }: { windows: Extract<GlueWindows, { known: true }> }) {
  const rows = (
    [
      ['Open time', windows.open],
      ['From first glue to full pressure', windows.totalAssembly],
      ['In clamps', windows.clamp],
      ['Cure', windows.cure],
    ] as const
  ).map(([name, window]) => ({
    name,
    says: (
      <>
        <b className="figures">{minutesWords(window)}</b>: {window.working.formula} (
        {Object.entries(window.working.inputs)
          .map(([input, value]) => `${input} ${value}`)
          .join(', ')}
        ). {window.working.source} ({CONFIDENCE[window.working.confidence]})
      </>
    ),
  }));
  const notes = windows.notes.map((note, index) => ({ name: index === 0 ? 'Mind' : 'And', says: note }));
  return <Working of="each time" rows={[{ name: 'Glue', says: windows.adhesiveName }, ...rows, ...notes]} />;
}
