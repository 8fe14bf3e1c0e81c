'use client';
import { saveSettings, type DeviceSettings } from '@/lib/store/device-database';
import { formatLength } from '@/lib/domain/measure';
import { useBenchAddress } from '../shell/address';
import { useBench } from '../shell/bench-context';
import { Frame } from '../shell/frame';
import { lengthStyle } from '../shell/length-style';
import { OutsideFoot } from '../shell/outside-foot';
import { ViewHeading } from '../shell/view-heading';
import { SizeText } from '../entry/size-text';
import { CheckRow } from '../entry/check-row';
import { AccountsOnPhone } from './accounts-on-phone';
import { Choice } from './choice';
import { StorageAnswer } from './storage-answer';

/** 43 1/2 in less 1/32: shows what each precision makes of a length. */
const SAMPLE = 706_628;

const DENOMINATORS: readonly DeviceSettings['denominator'][] = [8, 16, 32, 64];

/** Units, light and text size of this phone; its storage; the accounts on it. */
export function SettingsView() {
  const { settings } = useBench();
  const { buildId } = useBenchAddress();
  const set = (changes: Partial<DeviceSettings>) => void saveSettings(changes);
  const sample = (changes: Partial<DeviceSettings>) => (
    <SizeText sizes={[formatLength(SAMPLE, lengthStyle({ ...settings, ...changes }))]} />
  );
  return (
    <Frame title="Holdfast" home={buildId ? { buildId } : { view: 'builds' }} foot={<OutsideFoot />}>
      <div className="bench-page">
        <ViewHeading focusKey="settings">Settings</ViewHeading>
        <Choice
          legend="Lengths"
          value={settings.system}
          options={[
            { value: 'imperial', word: 'Inches' },
            { value: 'metric', word: 'Millimetres' },
          ]}
          onChoose={(system) => set({ system })}
        />
        {settings.system === 'imperial' && (
          <>
            <Choice
              legend="To the nearest"
              value={settings.denominator}
              options={DENOMINATORS.map((denominator) => ({
                value: denominator,
                word: <span className="fraction">1/{denominator}</span>,
                says: sample({ denominator }),
              }))}
              onChoose={(denominator) => set({ denominator })}
            />
            <CheckRow checked={settings.feet} onChange={(feet) => set({ feet })}>
              Feet for 12 inches and more: {sample({ feet: true })}
            </CheckRow>
          </>
        )}
        <Choice
          legend="Light"
          value={settings.theme}
          options={[
            { value: 'phone', word: 'As the phone' },
            { value: 'day', word: 'Day' },
            { value: 'dim', word: 'Dim shop' },
          ]}
          onChoose={(theme) => set({ theme })}
        />
        <Choice
          legend="Text"
          value={settings.textScale}
          options={[
            { value: 1, word: 'As drawn' },
            { value: 1.15, word: <span className="text-[1.15em]">Larger</span> },
            { value: 1.3, word: <span className="text-[1.3em]">Largest</span> },
          ]}
          onChoose={(textScale) => set({ textScale })}
        />
        <CheckRow checked={settings.photosOnWifiOnly} onChange={(photosOnWifiOnly) => set({ photosOnWifiOnly })}>
          Send photos over Wi-Fi only
        </CheckRow>
        <StorageAnswer />
        <AccountsOnPhone />
      </div>
    </Frame>
  );
}
