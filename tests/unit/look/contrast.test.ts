import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

/**
 * Relative luminance and contrast ratio as defined in WCAG 2.2 (https://www.w3.org/TR/WCAG22/, definitions
 * "relative luminance" and "contrast ratio"). Text is held to 7:1 (success criterion 1.4.6, enhanced), marks
 * and the edges of controls to 3:1 (1.4.11, non-text).
 */
function luminance(hex: string): number {
  const channel = (at: number) => {
    const value = parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

const css = readFileSync('app/globals.css', 'utf8');
const tokens = new Map<string, { light: string; dark: string }>();
for (const match of css.matchAll(/--([\w-]+):\s*light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)) {
  const [, name, light, dark] = match as unknown as [string, string, string, string];
  tokens.set(name, { light, dark });
}

function ratio(text: string, ground: string, theme: 'light' | 'dark'): number {
  const [a, b] = [tokens.get(text), tokens.get(ground)];
  if (!a || !b) throw new Error(`no token ${a ? ground : text}`);
  return contrast(a[theme], b[theme]);
}

const grounds = ['paper', 'raised', 'shoal', 'buff'];
const tones = ['info', 'ok', 'warn', 'danger', 'ready', 'out', 'held', 'clear', 'upcoming', 'due', 'overdue'];
const textPairs: [string, string][] = [
  ...['ink', 'ink-soft', 'line'].flatMap((text) => grounds.map((on): [string, string] => [text, on])),
  ...tones.flatMap((tone) =>
    ['paper', 'raised', 'shoal', `${tone}-tint`].map((on): [string, string] => [tone, on]),
  ),
  ...tones.map((tone): [string, string] => ['ink', `${tone}-tint`]),
  ...tones.map((tone): [string, string] => ['ink-soft', `${tone}-tint`]),
  ['act-ink', 'act'],
  ['act-ink', 'act-over'],
  ['danger-ink', 'danger-act'],
  ['paper', 'ink'],
];
const edgePairs = [
  ...['edge', 'sign', 'line'].flatMap((mark) => grounds.map((on): [string, string] => [mark, on])),
  ...tones.map((tone): [string, string] => ['sign', `${tone}-tint`]),
];

test('the formula gives the ratios the standard states: 21:1 for black on white, 1:1 for alike', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  expect(contrast('#123456', '#123456')).toBe(1);
  // #767676 on white is the well-known lightest grey above 4.5:1 (memory; 4.54).
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
});

for (const theme of ['light', 'dark'] as const) {
  test.each(textPairs)(`text in ${theme}: %s on %s is at least 7:1`, (text, ground) => {
    expect(ratio(text, ground, theme)).toBeGreaterThanOrEqual(7);
  });
  test.each(edgePairs)(`marks in ${theme}: %s on %s is at least 3:1`, (mark, ground) => {
    expect(ratio(mark, ground, theme)).toBeGreaterThanOrEqual(3);
  });
}
