'use client';
import type { PlanStep } from '@/lib/domain/plan/document';
import { windowsOf } from '@/lib/domain/build/locks';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TrueFractions } from '../entry/true-fractions';
import { minutesWords } from '../entry/time-words';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { GlueWorking } from './glue-working';
import { useShopTemperature } from './use-shop-temperature';

/** Said before the bottle is opened: how warm, how long it stays open, how many clamps, in which order. */
export function GlueBefore({ step }: { step: PlanStep }) {
  const { settings, format } = useBench();
  const { plan } = useBuild();
  const temperature = useShopTemperature();
  const glueUp = step.glueUp;
  if (!glueUp) return null;
  const { read } = temperature;
  const windows = windowsOf(plan, step.id, read.ok ? read.temperatureC : null);
  const { clamps } = glueUp;
  return (
    <section aria-labelledby="glue-before" className="grid gap-4">
      <h2 id="glue-before" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Before you open the bottle
      </h2>
      <Field
        label={`Temperature of the wood, ${settings.system === 'imperial' ? '°F' : '°C'}`}
        hint="Times follow from it. Leave it empty when you do not know."
        error={read.ok ? undefined : read.message}
      >
        <input
          inputMode="decimal"
          autoComplete="off"
          className="max-w-40"
          value={temperature.text}
          onChange={(event) => temperature.setText(event.target.value)}
        />
      </Field>
      {windows.known ? (
        <>
          {windows.temperature === 'too-cold' && (
            <Notice tone="danger" title="Too cold.">
              {windows.notes[0]}
            </Notice>
          )}
          <dl className="grid grid-cols-[auto_1fr] gap-x-4">
            {[
              ['Open time', `${minutesWords(windows.open)}, for ${joints(glueUp.joints)}`],
              ['In clamps', minutesWords(windows.clamp)],
              ['No stress for', minutesWords(windows.cure)],
              [
                'Clamps',
                `${clamps.count}${clamps.opening ? `, opening to ${format(clamps.opening).text}` : ''}: laid out and set first`,
              ],
            ].map(([name, says]) => (
              <div key={name} className="col-span-2 grid grid-cols-subgrid border-b border-line py-2">
                <dt className="font-figures text-soft">{name}</dt>
                <dd className="figures font-semibold">{says}</dd>
              </div>
            ))}
          </dl>
          <GlueWorking windows={windows} />
        </>
      ) : (
        <Notice tone="wait">{windows.message}</Notice>
      )}
      <GlueOrder order={glueUp.order} />
      {glueUp.notBefore && <Notice tone="wait">{glueUp.notBefore}</Notice>}
    </section>
  );
}

const joints = (count: number) => (count === 1 ? 'one joint' : `${count} joints`);

/** The order in which glue is spread and the joint closed. */
export function GlueOrder({ order }: { order: readonly string[] }) {
  return (
    <ol className="border-t-2 border-iron">
      {order.map((line, index) => (
        <li key={line} className="grid min-h-[52px] grid-cols-[2rem_1fr] items-center border-b border-line py-1.5">
          <b className="figures font-semibold">{index + 1}</b>
          <TrueFractions text={line} />
        </li>
      ))}
    </ol>
  );
}
