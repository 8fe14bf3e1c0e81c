'use client';
import { useId, type ReactNode } from 'react';

interface ChoiceProps<V extends string | number> {
  legend: string;
  value: V;
  options: readonly { value: V; word: ReactNode; says?: ReactNode }[];
  onChoose: (value: V) => void;
}

/** One of a few, all in sight; each is a large target. */
export function Choice<V extends string | number>({ legend, value, options, onChoose }: ChoiceProps<V>) {
  const name = useId();
  return (
    <fieldset>
      <legend className="pb-2 font-figures text-[1.25rem] font-semibold">{legend}</legend>
      <div className="grid auto-cols-fr grid-flow-col gap-3">
        {options.map((option) => (
          <label
            key={option.value}
            className={`flex min-h-[81px] cursor-pointer flex-col items-center justify-center rounded-plate border-2 px-1 py-2 text-center font-figures text-[1.25rem] leading-tight font-semibold has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-blue ${
              option.value === value ? 'border-blue bg-blue text-on-blue' : 'border-iron bg-paper active:bg-line'
            }`}
          >
            <input
              type="radio"
              name={name}
              className="sr-only"
              checked={option.value === value}
              onChange={() => onChoose(option.value)}
            />
            {option.word}
            {option.says && <span className="text-[1rem] font-medium">{option.says}</span>}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
