import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { tagLook } from '../../src/ui/tag-look.ts';
import { contrastRatio } from './contrast.ts';

const css = readFileSync(new URL('../../src/ui/tokens.css', import.meta.url), 'utf8');

/** Colours of the first rule with this selector. */
function coloursOf(selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`);
  if (start < 0) throw new Error(`no rule ${selector}`);
  const body = css.slice(start, css.indexOf('}', start));
  return Object.fromEntries([...body.matchAll(/--([a-z-]+): (#[0-9a-f]{6});/g)].map((m) => [m[1], m[2]]));
}

const themes = {
  light: coloursOf(':root'),
  dark: coloursOf(":root[data-theme='dark']"),
  auto: coloursOf(":root[data-theme='auto']"),
};

const worded = [
  ['ink', 'paper'],
  ['ink', 'surface'],
  ['soft', 'paper'],
  ['soft', 'surface'],
  ['ink', 'caution'],
  ['on-running-fill', 'running-fill'],
  ['on-over-fill', 'over-fill'],
  ['on-soon-fill', 'soon-fill'],
  ['on-caution', 'caution'],
  ['surface', 'ink'],
] as const;
const shapes = ['running', 'soon', 'over', 'done'] as const;

describe.each(['light', 'dark'] as const)('%s theme', (theme) => {
  const colour = (name: string): string => themes[theme][name] ?? '';
  test.each(worded)('words in %s on %s: 7:1', (ink, ground) => {
    expect(contrastRatio(colour(ink), colour(ground))).toBeGreaterThanOrEqual(7);
  });
  test.each(shapes.flatMap((shape) => [[shape, 'paper'] as const, [shape, 'surface'] as const]))(
    'shape %s on %s: 3:1',
    (shape, ground) => {
      expect(contrastRatio(colour(shape), colour(ground))).toBeGreaterThanOrEqual(3);
    },
  );
});

test('auto in the dark is the dark theme', () => {
  expect(themes.auto).toEqual(themes.dark);
  expect(Object.keys(themes.dark).sort()).toEqual(Object.keys(themes.light).sort());
});

test('the contrast formula: black on white is 21, WCAG 2.2', () => {
  expect(contrastRatio('#000000', '#ffffff')).toBeCloseTo(21, 6);
  expect(contrastRatio('#777777', '#ffffff')).toBeCloseTo(4.48, 2);
});

test('no text size is under 15 px', () => {
  const sizes = [...css.matchAll(/--(?:text|count)-[a-z-]+: ([\d.]+)rem/g)].map((m) => Number(m[1]) * 16);
  expect(sizes.length).toBeGreaterThan(10);
  expect(Math.min(...sizes)).toBeGreaterThanOrEqual(15);
});

test.each([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12])('words on tag %d: 7:1', (number) => {
  const { fill, ink } = tagLook(number, '');
  expect(contrastRatio(ink, fill)).toBeGreaterThanOrEqual(7);
});
