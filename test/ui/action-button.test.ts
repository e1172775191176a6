// @vitest-environment happy-dom
import { flushSync, mount, unmount } from 'svelte';
import { afterEach, expect, test, vi } from 'vitest';
import ActionButton from '../../src/ui/action-button.svelte';

let mounted: Record<string, unknown> | null = null;
afterEach(() => {
  if (mounted !== null) void unmount(mounted);
  mounted = null;
});

type Props = { onpress: () => void | Promise<unknown>; refusal?: string };
function show(props: Props): HTMLButtonElement {
  const target = document.createElement('div');
  document.body.replaceChildren(target);
  mounted = mount(ActionButton, { target, props: { label: '8 stripped, next', savingText: 'Saving', ...props } });
  flushSync();
  const button = target.querySelector('button');
  if (button === null) throw new Error('no button');
  return button;
}

test('from the press until it is saved it says saving and takes no second press', async () => {
  let saved: () => void = () => undefined;
  const onpress = vi.fn(() => new Promise<void>((resolve) => (saved = resolve)));
  const button = show({ onpress });
  expect(button.textContent).not.toContain('Saving');
  button.click();
  button.click();
  flushSync();
  expect(onpress).toHaveBeenCalledTimes(1);
  expect(button.textContent).toContain('Saving');
  expect(button.getAttribute('aria-disabled')).toBe('true');
  saved();
  await vi.waitFor(() => expect(button.textContent).not.toContain('Saving'));
  button.click();
  expect(onpress).toHaveBeenCalledTimes(2);
});

test('after a failed write it can be pressed again', async () => {
  const onpress = vi.fn(() => Promise.reject(new Error('not saved')));
  const button = show({ onpress });
  button.click();
  await vi.waitFor(() => expect(button.getAttribute('aria-disabled')).toBe('false'));
  button.click();
  expect(onpress).toHaveBeenCalledTimes(2);
});

test('a refused action says why and does nothing', () => {
  const onpress = vi.fn();
  const button = show({ onpress, refusal: 'Fill 2 more first' });
  button.click();
  expect(onpress).not.toHaveBeenCalled();
  expect(button.textContent).toContain('Fill 2 more first');
});
