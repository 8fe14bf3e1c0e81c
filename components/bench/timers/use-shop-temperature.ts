'use client';
import { useDraft } from '../entry/use-draft';
import { dayKey } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';
import { readTemperature } from './temperature';

/** Temperature of the wood as told today; another day starts with none, since a garage does not keep it. */
export function useShopTemperature() {
  const { settings } = useBench();
  const { build } = useBuild();
  const today = dayKey(useClock(60_000));
  const { text, setText } = useDraft(`temperature/${build.id}/${today}`);
  return { text, setText, read: readTemperature(text, settings) };
}
