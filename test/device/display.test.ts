import { expect, test } from 'vitest';
import { createDisplay } from '../../src/device/display.ts';

class FakeQuery extends EventTarget {
  matches = false;
}

const setUp = (navigator: { standalone?: boolean }) => {
  const query = new FakeQuery();
  const display = createDisplay({ navigator, matchMedia: () => query });
  const become = (matches: boolean) => {
    query.matches = matches;
    query.dispatchEvent(new Event('change'));
  };
  return { display, become };
};

test('a tab becomes installed, and is heard', () => {
  const { display, become } = setUp({});
  const heard: string[] = [];
  display.subscribe((state) => heard.push(state));
  become(true);
  display.release();
  become(false);
  expect(heard).toEqual(['tab', 'installed']);
});

test('a tab of a browser that clears data after 7 days is told apart', () => {
  expect(setUp({ standalone: false }).display.current).toBe('clearable tab');
  expect(setUp({ standalone: true }).display.current).toBe('installed');
});
