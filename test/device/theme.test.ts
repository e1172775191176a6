import { readFileSync } from 'node:fs';
import { runInNewContext } from 'node:vm';
import { describe, expect, test } from 'vitest';
import { readTheme, setTheme, themes, type ThemeWindow } from '../../src/device/theme.ts';

const script = readFileSync(new URL('../../static/theme.js', import.meta.url), 'utf8');

function fakeWindow(): ThemeWindow {
  const kept = new Map<string, string>();
  return {
    document: { documentElement: { dataset: {} } },
    localStorage: { getItem: (key) => kept.get(key) ?? null, setItem: (key, value) => void kept.set(key, value) },
  };
}

/** What the page shows before its first paint. */
function shownAtStart(window: ThemeWindow): string | undefined {
  const { document, localStorage } = window;
  runInNewContext(script, { document, localStorage });
  return document.documentElement.dataset['theme'];
}

describe('theme', () => {
  test('light until somebody chose', () => {
    const window = fakeWindow();
    expect(readTheme(window)).toBe('light');
    expect(shownAtStart(window)).toBe('light');
  });

  test.each(themes)('%s is shown at once and at the next start', (theme) => {
    const window = fakeWindow();
    setTheme(theme, window);
    expect(window.document.documentElement.dataset['theme']).toBe(theme);
    delete window.document.documentElement.dataset['theme'];
    expect(shownAtStart(window)).toBe(theme);
    expect(readTheme(window)).toBe(theme);
  });
});
