'use client';
import type { PlanMethod } from '@/lib/domain/plan/document';
import { PlanText } from '../entry/plan-text';
import { Cautions } from './cautions';

interface MethodsProps {
  methods: readonly PlanMethod[];
  chosen: string;
  onChoose: (methodId: string) => void;
}

/** Ways to do the step by the tools at hand; the safer stands first and is chosen until another is. */
export function Methods({ methods, chosen, onChoose }: MethodsProps) {
  if (methods.length === 0) return null;
  const method = methods.find(({ id }) => id === chosen) ?? methods[0]!;
  return (
    <fieldset className="grid gap-3">
      <legend className="font-figures text-[1.375rem] font-semibold">
        {methods.length > 1 ? 'How: the safer way first' : 'How'}
      </legend>
      {methods.length > 1 &&
        methods.map(({ id, name, tools }) => (
          <label
            key={id}
            className={`grid min-h-[81px] cursor-pointer grid-cols-[auto_1fr] items-center gap-x-4 rounded-plate border-2 bg-paper px-4 py-2 active:bg-line ${
              id === method.id ? 'border-blue' : 'border-iron'
            }`}
          >
            <input
              type="radio"
              name="method"
              className="size-7 accent-blue"
              checked={id === method.id}
              onChange={() => onChoose(id)}
            />
            <span>
              <span className="block font-semibold leading-snug">{name}</span>
              <span className="block text-[1.0625rem] text-soft">{tools.join(', ')}</span>
            </span>
          </label>
        ))}
      <PlanText text={method.body} />
      <Cautions cautions={method.cautions} />
    </fieldset>
  );
}
