'use client';
import { useLiveQuery } from 'dexie-react-hooks';
import { useState } from 'react';
import { getEmergencyCard } from '@/lib/store/queries/held';
import { ActButton } from '../entry/act-button';
import { Button } from '@/components/ui/button';
import { linkLook } from '@/components/ui/link-look';
import { useBench } from '../shell/bench-context';
import { Frame } from '../shell/frame';
import { OutsideFoot } from '../shell/outside-foot';
import { ViewHeading } from '../shell/view-heading';
import { CardForm } from './card-form';
import { NearMissForm } from './near-miss-form';

/** Readable from across the room by someone who has never seen this phone. Works with no signal but for the call itself. */
export function EmergencyView({ buildId }: { buildId: string | null }) {
  const { db } = useBench();
  const row = useLiveQuery(async () => ({ card: await getEmergencyCard(db) }), [db]);
  const [editing, setEditing] = useState(false);
  const card = row?.card;
  const number = card?.number.replace(/[^\d+*#]/g, '') ?? '';
  return (
    <Frame title="Emergency" home={buildId ? { buildId } : { view: 'builds' }} foot={<OutsideFoot />}>
      <div className="bench-page">
        <ViewHeading focusKey="emergency">Emergency</ViewHeading>
        {row && !editing && (
          <>
            {number ? (
              <a className={`${linkLook.plate} min-h-32! bg-red! text-[2.25rem]! text-chalk!`} href={`tel:${number}`}>
                Call {card?.number}
              </a>
            ) : (
              <p className="rounded-[3px] border-2 border-l-[12px] border-red bg-paper px-4 py-3">
                <b className="text-red">No number yet.</b> Put in the emergency number of your country and where you
                are, before you need them.
              </p>
            )}
            <dl className="grid gap-4">
              {[
                ['You are at', card?.address],
                ['First-aid kit, eye wash, extinguisher', card?.kitPlace],
                ['Then tell', card?.contact],
              ].map(([name, says]) =>
                says ? (
                  <div key={name} className="border-b border-line pb-3">
                    <dt className="text-soft">{name}</dt>
                    <dd className="font-figures text-[2rem] leading-tight font-semibold whitespace-pre-line">{says}</dd>
                  </div>
                ) : null,
              )}
            </dl>
            <ol className="grid gap-2 border-t-2 border-iron pt-3">
              <li>Power off at the plug, before you touch anyone or anything.</li>
              <li>Call. Say where you are first.</li>
              <li>Press hard on what bleeds, with something clean, and keep pressing.</li>
            </ol>
            <p className="text-[1.0625rem] text-soft">
              What the person on the telephone tells you comes before this card.
            </p>
            {number ? (
              <ActButton onClick={() => setEditing(true)}>Change the card</ActButton>
            ) : (
              <Button kind="plate" onClick={() => setEditing(true)}>
                Fill in the card
              </Button>
            )}
          </>
        )}
        {row && editing && <CardForm card={card ?? null} onDone={() => setEditing(false)} />}
        {buildId && !editing && <NearMissForm buildId={buildId} />}
      </div>
    </Frame>
  );
}
