'use client';
import { useId, useState } from 'react';
import type { ParsedLength } from '@/lib/domain/measure';
import { LengthText } from '@/components/ui/length-text';
import { useBench } from '../shell/bench-context';
import { otherSystem, padKeys, pressKey, readLength } from './length-text-edit';

export interface LengthFieldValue {
  id: string;
  /** What is measured. */
  label: string;
  text: string;
}

interface LengthEntryProps {
  fields: readonly LengthFieldValue[];
  onText: (id: string, text: string) => void;
  /** Says what is wrong with a text that does not read; before that, only what does read is echoed. */
  showProblems: boolean;
}

/**
 * Lengths put in with a pad of large keys, or with the phone's keyboard: fractions as they stand on the tape. What was
 * understood is echoed in both systems, so that a slip is seen before it is kept.
 */
export function LengthEntry({ fields, onText, showProblems }: LengthEntryProps) {
  const { settings } = useBench();
  const [active, setActive] = useState(fields[0]?.id ?? '');
  const [keyboard, setKeyboard] = useState(false);
  const field = fields.find(({ id }) => id === active) ?? fields[0];
  return (
    <div className="grid gap-3">
      {fields.map((each) => (
        <LengthInput
          key={each.id}
          field={each}
          active={!keyboard && fields.length > 1 && each.id === field?.id}
          keyboard={keyboard}
          showProblems={showProblems}
          onFocus={() => setActive(each.id)}
          onText={(text) => onText(each.id, text)}
        />
      ))}
      {!keyboard && field && (
        <div className="grid grid-cols-4 gap-2" role="group" aria-label={`Keys for ${field.label}`}>
          {padKeys[settings.system].map((key) => (
            <button
              key={key.label}
              type="button"
              aria-label={key.says ?? key.label}
              onClick={() => onText(field.id, pressKey(field.text, key))}
              className="h-[68px] touch-manipulation rounded-plate border-2 border-iron bg-paper font-figures text-[1.625rem] font-semibold select-none active:bg-line"
            >
              <span className={/\d\/\d/.test(key.label) ? 'fraction' : key.label.length > 1 ? 'text-[1.25rem]' : ''}>
                {key.label}
              </span>
            </button>
          ))}
        </div>
      )}
      <button
        type="button"
        onClick={() => setKeyboard(!keyboard)}
        className="min-h-[52px] justify-self-start font-figures text-[1.125rem] font-medium text-blue underline underline-offset-4"
      >
        {keyboard ? 'Use the large keys' : 'Use the phone’s keyboard'}
      </button>
    </div>
  );
}

interface LengthInputProps {
  field: LengthFieldValue;
  active: boolean;
  keyboard: boolean;
  showProblems: boolean;
  onFocus: () => void;
  onText: (text: string) => void;
}

function LengthInput({ field, active, keyboard, showProblems, onFocus, onText }: LengthInputProps) {
  const { settings } = useBench();
  const id = useId();
  const read = readLength(field.text, settings);
  const problem = showProblems && !read.ok ? read.message : null;
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="font-figures text-[1.125rem] font-semibold">
        {field.label}
      </label>
      <input
        id={id}
        value={field.text}
        inputMode={keyboard ? 'text' : 'none'}
        autoComplete="off"
        autoCapitalize="none"
        spellCheck={false}
        aria-describedby={`${id}-echo`}
        aria-invalid={problem ? true : undefined}
        onFocus={onFocus}
        onChange={(event) => onText(event.target.value)}
        className={`figures min-h-[68px] w-full rounded-plate border-2 bg-paper px-4 text-[2.125rem] font-semibold aria-invalid:border-red ${
          active ? 'border-blue outline-2 outline-blue' : 'border-iron'
        }`}
      />
      <p id={`${id}-echo`} className="min-h-[1.6em] text-[1.0625rem]" aria-live="polite">
        {problem ? <span className="font-semibold text-red">{problem}</span> : <Echo read={read} />}
      </p>
    </div>
  );
}

function Echo({ read }: { read: ParsedLength }) {
  const { formatRead, settings } = useBench();
  if (!read.ok) return null;
  const shown = formatRead(read.length);
  return (
    <span className="text-soft">
      reads {shown.rounded ? 'as about ' : 'as '}
      <LengthText value={shown} className="font-semibold text-iron" />, {otherSystem(read.length, settings)}
    </span>
  );
}
