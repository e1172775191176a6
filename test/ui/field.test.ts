// @vitest-environment happy-dom
import { flushSync, mount } from 'svelte';
import { expect, test, vi } from 'vitest';
import Field from '../../src/ui/field.svelte';
import NumberPad from '../../src/ui/number-pad.svelte';

function target(): HTMLElement {
  const element = document.createElement('div');
  document.body.replaceChildren(element);
  return element;
}

test('the error is described at the field and what was typed stays', () => {
  const place = target();
  const error = 'An oven reads between 0 and 400 °C; 1000 was typed.';
  mount(Field, { target: place, props: { label: 'Oven reading', value: '1000', oninput: () => undefined, error } });
  flushSync();
  const input = place.querySelector('input');
  const described = input?.getAttribute('aria-describedby') ?? '';
  expect(place.querySelector(`[id="${described}"]`)?.textContent).toBe(error);
  expect(input?.getAttribute('aria-invalid')).toBe('true');
  expect(input?.value).toBe('1000');
  expect(place.querySelector('label')?.getAttribute('for')).toBe(input?.id);
});

test('markup that was typed is shown as text', () => {
  const place = target();
  mount(Field, { target: place, props: { label: 'x', value: '', oninput: () => undefined, error: '<b>1</b>' } });
  flushSync();
  expect(place.querySelector('b')).toBeNull();
});

test('the pad writes one decimal sign only', () => {
  const place = target();
  const typed = vi.fn();
  const names = { name: 'Number', eraseName: 'Erase', decimalName: 'Comma', minusName: 'Minus' };
  mount(NumberPad, { target: place, props: { typed: '92,5', onchange: typed, decimalSign: ',', ...names } });
  flushSync();
  const key = (name: string): void => place.querySelector<HTMLElement>(`[aria-label="${name}"]`)?.click();
  key('Comma');
  expect(typed).not.toHaveBeenCalled();
  key('7');
  key('Erase');
  key('Minus');
  expect(typed.mock.calls).toEqual([['92,57'], ['92,'], ['-92,5']]);
});
