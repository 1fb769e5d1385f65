import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync(new URL('../../../app/globals.css', import.meta.url), 'utf8');

const inksOf = (block: string) =>
  new Map([...block.matchAll(/--([a-z]+):\s*(#[0-9a-f]{6,8});/g)].map((m) => [m[1] ?? '', m[2] ?? '']));

const light = inksOf(css.slice(0, css.indexOf('@media (prefers-color-scheme: dark)')));
const dark = inksOf(css.slice(css.indexOf('@media (prefers-color-scheme: dark)')));

const channels = (hex: string) => [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16) / 255);
const opacity = (hex: string) => (hex.length === 9 ? parseInt(hex.slice(7), 16) / 255 : 1);

const over = (top: string, under: string) => {
  const share = opacity(top);
  const below = channels(under);
  return channels(top).map((value, at) => share * value + (1 - share) * (below[at] ?? 0));
};

/** Relative luminance and contrast ratio: WCAG 2.2, definitions in section "Relative luminance". */
const luminance = (rgb: number[]) => {
  const [red = 0, green = 0, blue = 0] = rgb.map((v) =>
    v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4,
  );
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
};

const contrast = (a: number[], b: number[]) => {
  const [dim = 0, bright = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (bright + 0.05) / (dim + 0.05);
};

describe.each([
  ['light', light],
  ['dark', dark],
])('the %s inks', (_theme, inks) => {
  const ink = (name: string) => {
    const hex = inks.get(name);
    if (hex === undefined) throw new Error(`--${name} is not set`);
    return hex;
  };
  const grounds = () => [channels(ink('paper')), channels(ink('sheet'))];

  // WCAG 2.2, success criterion 1.4.3: 4.5 to 1 for text.
  it.each(['ink', 'quiet', 'phys', 'call'])('--%s is readable as text on paper and sheet', (name) => {
    for (const ground of grounds()) expect(contrast(channels(ink(name)), ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(['ink', 'call'])('--%s is readable on a wash of vermilion', (name) => {
    const ground = over(ink('callwash'), ink('paper'));
    expect(contrast(channels(ink(name)), ground)).toBeGreaterThanOrEqual(4.5);
  });

  // WCAG 2.2, success criterion 1.4.11: 3 to 1 for what a drawing or a control needs.
  it.each(['stat', 'edge', 'phys', 'call', 'ink'])('--%s is visible as a line', (name) => {
    for (const ground of grounds()) expect(contrast(channels(ink(name)), ground)).toBeGreaterThanOrEqual(3);
  });
});

it('measures black on white as 21 to 1, as WCAG 2.2 states', () => {
  expect(contrast([0, 0, 0], [1, 1, 1])).toBeCloseTo(21);
});
