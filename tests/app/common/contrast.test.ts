import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

/** Relative luminance and contrast ratio as defined in WCAG 2.2 (w3.org/TR/WCAG22/#dfn-relative-luminance). */
function luminance(colour: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light + 0.05) / (dark + 0.05);
}

const source = readFileSync('src/css/tokens.scss', 'utf8');
function theme(name: string): Map<string, string> {
  const block = new RegExp(`\\$wf-${name}: \\(([\\s\\S]*?)\\n\\);`).exec(source)?.[1] ?? '';
  return new Map(
    [...block.matchAll(/'([a-z0-9-]+)':\s*(#[0-9A-Fa-f]{6})/g)].map((match) => [match[1] ?? '', match[2] ?? '']),
  );
}

it('reckons black on white as 21 to 1, and #767676 as the lightest grey that passes', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6);
  expect(contrast('#767676', '#ffffff')).toBeGreaterThanOrEqual(4.5);
  expect(contrast('#777777', '#ffffff')).toBeLessThan(4.5);
});

const text = ['ink', 'ink-2', 'ink-3', 'act', 'red', 'green', 'ochre'];
const grounds = ['paper', 'tint', 'leaf', 'act-tint'];
const pairs = [
  ...text.flatMap((colour) => grounds.map((ground) => [colour, ground] as const)),
  ['ochre', 'ochre-tint'] as const,
  ['act-ink', 'act'] as const,
  ['act-ink', 'act-hover'] as const,
  ['spine-ink', 'spine'] as const,
  ['spine-ink-2', 'spine'] as const,
  ['paper', 'ink'] as const,
];

describe.each(['light', 'dark'])('the %s sheet', (name) => {
  const colours = theme(name);
  const of = (token: string) => colours.get(token) ?? expect.fail(`no token ${token}`);

  it.each(pairs)('%s can be read on %s (4.5 to 1)', (colour, ground) => {
    expect(contrast(of(colour), of(ground))).toBeGreaterThanOrEqual(4.5);
  });

  it.each(['paper', 'leaf', 'tint'])('edges of controls and the focus are seen on %s (3 to 1)', (ground) => {
    expect(contrast(of('rule-3'), of(ground))).toBeGreaterThanOrEqual(3);
    expect(contrast(of('act'), of(ground))).toBeGreaterThanOrEqual(3);
  });
});
