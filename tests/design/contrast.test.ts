import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

/** Relative luminance and contrast ratio: WCAG 2.2, "relative luminance" and "contrast ratio" definitions. */
function luminance(hex: string): number {
  const channel = (at: number) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

const css = readFileSync('app/globals.css', 'utf8');

function tokens(block: RegExp): Record<string, string> {
  const body = block.exec(css)?.[1];
  if (!body) throw new Error(`no block ${String(block)} in app/globals.css`);
  return Object.fromEntries([...body.matchAll(/--([a-z-]+):\s*(#[0-9a-f]{6})/g)].map((m) => [m[1], m[2]]));
}

const themes = {
  day: tokens(/^:root \{([^}]*)\}/m),
  'dim by choice': tokens(/^:root\[data-theme='dim'\] \{([^}]*)\}/m),
  'dim by the phone': tokens(/:root:not\(\[data-theme='day'\]\) \{([^}]*)\}/m),
};

/** Text on ground, and the least ratio: 7 for text read at the bench (WCAG 1.4.6), 4.5 for marks and large labels (1.4.3). */
const pairs: [string, string, number][] = [
  ['iron', 'chalk', 7],
  ['iron', 'paper', 7],
  ['soft', 'chalk', 7],
  ['soft', 'paper', 7],
  ['blue', 'chalk', 7],
  ['blue', 'paper', 7],
  ['on-blue', 'blue', 7],
  ['on-amber', 'amber-ground', 7],
  ['amber', 'paper', 4.5],
  ['amber', 'chalk', 4.5],
  ['amber', 'amber-ground', 4.5],
  ['red', 'paper', 4.5],
  ['red', 'chalk', 4.5],
  ['green', 'paper', 4.5],
  ['green', 'chalk', 4.5],
];

describe.each(Object.entries(themes))('colours, %s', (_name, theme) => {
  it.each(pairs)('%s on %s is at least %d to 1', (text, ground, least) => {
    expect(contrast(theme[text]!, theme[ground]!)).toBeGreaterThanOrEqual(least);
  });
});

it('dim is the same whether the person or the phone chose it', () => {
  expect(themes['dim by the phone']).toEqual(themes['dim by choice']);
});
