// @vitest-environment happy-dom
import { beforeEach, expect, test } from 'vitest';
import { press } from '../../src/ui/press.ts';

let button: HTMLButtonElement;
let presses = 0;
let blocked = false;
let changedAt = Number.NEGATIVE_INFINITY;
let now = 10_000;

beforeEach(() => {
  document.body.replaceChildren();
  button = document.createElement('button');
  document.body.append(button);
  button.getBoundingClientRect = () => new DOMRect(100, 100, 200, 104);
  presses = 0;
  blocked = false;
  changedAt = Number.NEGATIVE_INFINITY;
  now = 10_000;
  press({ onpress: () => presses++, blocked: () => blocked, changedAt: () => changedAt })(button);
});

function pointer(type: string, target: EventTarget, more: PointerEventInit = {}, at = now): void {
  const event = new PointerEvent(type, {
    bubbles: true,
    pointerId: 1,
    isPrimary: true,
    button: 0,
    clientX: 150,
    clientY: 150,
    ...more,
  });
  Object.defineProperty(event, 'timeStamp', { value: at });
  target.dispatchEvent(event);
}
function click(detail: number, at = now, target: EventTarget = button): MouseEvent {
  const event = new MouseEvent('click', { bubbles: true, cancelable: true, detail });
  Object.defineProperty(event, 'timeStamp', { value: at });
  target.dispatchEvent(event);
  return event;
}

test('a tap acts once, although the browser adds a click', () => {
  pointer('pointerdown', button);
  pointer('pointerup', button);
  click(1);
  expect(presses).toBe(1);
});

test('a finger that slides within the target still presses', () => {
  pointer('pointerdown', button, { clientX: 110 });
  pointer('pointerup', button, { clientX: 290 });
  expect(presses).toBe(1);
});

test('a finger that leaves the target before it lifts does not press', () => {
  pointer('pointerdown', button);
  pointer('pointerup', button, { clientX: 350 });
  expect(presses).toBe(0);
});

test('a second finger anywhere spoils the press', () => {
  pointer('pointerdown', button);
  pointer('pointerdown', document.body, { pointerId: 2, isPrimary: false });
  pointer('pointerup', button);
  expect(presses).toBe(0);
});

test('a finger beside a resting palm does not press', () => {
  pointer('pointerdown', button, { pointerId: 2, isPrimary: false });
  pointer('pointerup', button, { pointerId: 2, isPrimary: false });
  click(1);
  expect(presses).toBe(0);
});

test('a touch that began within 300 ms of a change of screen does nothing; after that it acts', () => {
  changedAt = now - 299;
  pointer('pointerdown', button);
  pointer('pointerup', button, {}, now + 200);
  click(1, now + 201);
  expect(presses).toBe(0);
  changedAt = now - 300;
  pointer('pointerdown', button);
  pointer('pointerup', button);
  expect(presses).toBe(1);
});

test('a scroll that takes the finger over does not press', () => {
  pointer('pointerdown', button);
  pointer('pointercancel', button);
  pointer('pointerup', button);
  expect(presses).toBe(0);
});

test('a key and a screen reader act through clicks, also within 300 ms of a change', () => {
  changedAt = now;
  click(0);
  click(1, now + 5000);
  expect(presses).toBe(2);
});

test('a key acts also right after a tap', () => {
  pointer('pointerdown', button);
  pointer('pointerup', button);
  click(1);
  click(0);
  expect(presses).toBe(2);
});

test('nothing acts while it is blocked', () => {
  blocked = true;
  pointer('pointerdown', button);
  pointer('pointerup', button);
  click(0);
  expect(presses).toBe(0);
});

test('the click of a touch that took its button away acts on nothing that lay beneath', () => {
  const beneath = document.createElement('a');
  beneath.href = '#elsewhere';
  let beneathPresses = 0;
  press({ onpress: () => beneathPresses++ })(beneath);
  document.body.append(beneath);
  pointer('pointerdown', button);
  pointer('pointerup', button);
  button.remove();
  expect(click(1, now + 5, beneath).defaultPrevented).toBe(true);
  expect([presses, beneathPresses]).toEqual([1, 0]);

  expect(click(1, now + 900, beneath).defaultPrevented).toBe(false);
  expect(beneathPresses).toBe(1);
});

test('after a touch whose click never came, the next touch and any key act', () => {
  const other = document.createElement('button');
  let others = 0;
  other.addEventListener('click', () => others++);
  document.body.append(other);
  pointer('pointerdown', button);
  pointer('pointerup', button);
  click(0, now, other);
  pointer('pointerdown', button);
  pointer('pointerup', button);
  pointer('pointerdown', other);
  click(1, now + 500, other);
  expect([presses, others]).toEqual([2, 2]);
});
