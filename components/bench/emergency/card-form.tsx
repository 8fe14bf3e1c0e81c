'use client';
import { useState } from 'react';
import { saveEmergencyCard } from '@/lib/store/mutations/save-emergency-card';
import type { EmergencyCard } from '@/lib/store/rows';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { useAnnounce } from '../shell/announcer';
import { useBench } from '../shell/bench-context';

const empty: EmergencyCard = { address: '', number: '', kitPlace: '', contact: '' };

const FIELDS = [
  { key: 'number', label: 'Number to call', hint: 'The emergency number where you are', inputMode: 'tel' },
  {
    key: 'address',
    label: 'Address of this place',
    hint: 'So that anyone can say it: street, number, town, which door',
  },
  { key: 'kitPlace', label: 'Where the first-aid kit is', hint: 'And eye wash and extinguisher' },
  { key: 'contact', label: 'Then tell', hint: 'A name and a number' },
] as const;

/** The emergency card, filled in before it is needed. It stays on this phone. */
export function CardForm({ card, onDone }: { card: EmergencyCard | null; onDone: () => void }) {
  const { db } = useBench();
  const announce = useAnnounce();
  const [fields, setFields] = useState(card ?? empty);
  const [fault, setFault] = useState<string | null>(null);

  async function keep() {
    const notSaved = await saveEmergencyCard(db, fields);
    if (notSaved && !notSaved.ok) {
      setFault(notSaved.message);
      return;
    }
    announce('Emergency card kept on this phone');
    onDone();
  }

  return (
    <div className="grid gap-5">
      {FIELDS.map(({ key, label, hint, ...rest }) => (
        <Field key={key} label={label} hint={hint}>
          <textarea
            rows={key === 'number' ? 1 : 2}
            maxLength={300}
            value={fields[key]}
            onChange={(event) => setFields({ ...fields, [key]: event.target.value })}
            {...rest}
          />
        </Field>
      ))}
      {fault && (
        <Notice tone="danger" live="alert">
          {fault}
        </Notice>
      )}
      <Button kind="plate" onClick={() => void keep()}>
        Keep the card
      </Button>
      <ActButton onClick={onDone}>Leave it as it was</ActButton>
    </div>
  );
}
