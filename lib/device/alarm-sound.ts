/** Two short tones of our own: one for half of a time, one for its end. */
export type Tone = 'half' | 'end';

const TONES: Record<Tone, readonly { hz: number; from: number; for: number }[]> = {
  half: [
    { hz: 523.25, from: 0, for: 0.16 },
    { hz: 659.25, from: 0.2, for: 0.22 },
  ],
  end: [
    { hz: 784, from: 0, for: 0.18 },
    { hz: 587.33, from: 0.24, for: 0.18 },
    { hz: 784, from: 0.48, for: 0.4 },
  ],
};

let context: AudioContext | undefined;

/** Makes sound possible; called in the tap that starts a timer, since browsers allow none before a gesture. */
export async function unlockSound(): Promise<boolean> {
  if (typeof AudioContext === 'undefined') return false;
  if (context?.state === 'closed') context = undefined;
  context ??= new AudioContext();
  try {
    await context.resume();
  } catch {
    // A phone call may hold the sound; the flash on the screen still shows.
    return false;
  }
  return context.state === 'running';
}

/** Plays a tone; false where there is no sound, so that the screen can say so. */
export function playTone(tone: Tone): boolean {
  if (context?.state !== 'running') return false;
  for (const { hz, from, for: seconds } of TONES[tone]) {
    const start = context.currentTime + from;
    const gain = context.createGain();
    const oscillator = context.createOscillator();
    oscillator.type = 'triangle';
    oscillator.frequency.value = hz;
    gain.gain.setValueAtTime(0, start);
    gain.gain.linearRampToValueAtTime(0.5, start + 0.02);
    gain.gain.exponentialRampToValueAtTime(0.001, start + seconds);
    oscillator.connect(gain).connect(context.destination);
    oscillator.start(start);
    oscillator.stop(start + seconds);
  }
  return true;
}
