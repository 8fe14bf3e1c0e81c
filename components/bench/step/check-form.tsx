'use client';
import { useState } from 'react';
import type { EntryValue } from '@/lib/domain/build/kinds';
import { judgeCheck } from '@/lib/domain/build/judge-check';
import type { PlanCheck, PlanStep } from '@/lib/domain/plan/document';
import { evaluateSize } from '@/lib/domain/plan/key-sizes';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { LengthEntry } from '../entry/length-entry';
import { readLength } from '../entry/length-text-edit';
import { useDraft } from '../entry/use-draft';
import { useActs } from '../shell/act-context';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { toleranceWords } from './check-words';

interface CheckFormProps {
  step: PlanStep;
  check: PlanCheck;
  onDone: () => void;
}

type Verdict = EntryValue<'check-recorded'>['verdict'];

/** Takes a check: readings with the pad, judged as they are put in; out of tolerance is redone, or accepted with a reason. */
export function CheckForm({ step, check, onDone }: CheckFormProps) {
  const { settings, formatRead: format } = useBench();
  const { build, plan, values } = useBuild();
  const { act } = useActs();
  const labels = readingLabels(check);
  const [texts, setTexts] = useState<readonly string[]>(labels.map(() => ''));
  const [asked, setAsked] = useState(false);
  const reason = useDraft(`accept/${build.id}/${step.id}/${check.id}`);
  const reads = texts.map((text) => readLength(text, settings));
  const readings = reads.flatMap((read) => (read.ok ? [read.length] : []));
  const complete = readings.length === labels.length;
  const judged = complete ? judgeCheck(check, readings, values, plan) : null;
  const target = check.judge.kind === 'length' ? evaluateSize(check.judge.target, values, plan) : null;

  async function keep(verdict: Verdict, why?: string) {
    const saved = await act(`Check kept: ${check.what}`, (acts, db) =>
      acts.recordCheck(db, {
        buildId: build.id,
        stepId: step.id,
        checkId: check.id,
        readings,
        verdict,
        ...(why ? { reason: why } : {}),
      }),
    );
    if (!saved) return;
    reason.clear();
    onDone();
  }

  function keepJudged() {
    setAsked(true);
    if (judged && judged.verdict !== 'incomplete') void keep(judged.verdict);
  }

  const outside = judged?.verdict === 'outside';
  return (
    <div className="grid gap-4 rounded-plate border-2 border-blue bg-paper p-4">
      <div>
        <h3 className="text-[1.5rem]">{check.what}</h3>
        {check.how && <p className="mt-1">{check.how}</p>}
        <p className="figures mt-1 font-semibold">{toleranceWords(check, target?.ok ? target.length : null, format)}</p>
      </div>
      {labels.length > 0 && (
        <LengthEntry
          fields={labels.map((label, index) => ({ id: String(index), label, text: texts[index] ?? '' }))}
          onText={(id, text) => setTexts(texts.map((old, index) => (String(index) === id ? text : old)))}
          showProblems={asked}
        />
      )}
      {judged && (
        <Notice tone={outside ? 'danger' : judged.verdict === 'within' ? 'done' : 'wait'} live="status">
          <b>{judged.words}.</b>
          {outside && ` ${format(Math.abs(judged.off)).text} ${check.judge.kind === 'difference' ? 'apart' : 'out'}.`}
          {outside && check.ifNot && ` ${check.ifNot}`}
        </Notice>
      )}
      {check.judge.kind === 'yes' ? (
        <div className="grid grid-cols-2 gap-6">
          <ActButton onClick={() => void keep('outside')}>No</ActButton>
          <ActButton onClick={() => void keep('within')}>Yes</ActButton>
        </div>
      ) : (
        <ActButton onClick={keepJudged}>{outside ? 'Keep it: I take it again later' : 'Keep it'}</ActButton>
      )}
      {check.judge.kind === 'yes' && check.ifNot && <p className="text-soft">If not: {check.ifNot}</p>}
      {(outside || check.judge.kind === 'yes') && (
        <div className="grid gap-3 border-t border-line pt-3">
          <Field label="Or accept it as it is: why" hint="The reason goes into the log.">
            <textarea
              rows={2}
              maxLength={1000}
              value={reason.text}
              onChange={(event) => reason.setText(event.target.value)}
            />
          </Field>
          <ActButton disabled={reason.text.trim() === ''} onClick={() => void keep('accepted', reason.text.trim())}>
            Accept it as it is
          </ActButton>
        </div>
      )}
    </div>
  );
}

function readingLabels({ judge, what }: PlanCheck): string[] {
  if (judge.kind === 'yes') return [];
  return judge.kind === 'difference' ? [...judge.of] : [what];
}
