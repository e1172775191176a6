import { expect, test } from 'vitest';
import { fileRoutes, saveFile, type SaveFileWindow } from '../../src/device/save-file.ts';
import { FakeWindow } from '../fake/fake-window.ts';

const file = new File(['one line\n'], 'shift.jsonl', { type: 'application/jsonl' });

const setUp = (extra: Partial<Pick<SaveFileWindow, 'showSaveFilePicker' | 'navigator'>> = {}) => {
  const fake = new FakeWindow();
  const link = { href: '', download: '', clicks: 0, click: () => void (link.clicks += 1) };
  const revoked: string[] = [];
  const window: SaveFileWindow = {
    navigator: {},
    // Only the link's three members are used, so the element's type is claimed.
    document: { createElement: () => link } as unknown as Pick<Document, 'createElement'>,
    URL: { createObjectURL: () => 'blob:one', revokeObjectURL: (url) => void revoked.push(url) },
    setTimeout: fake.setTimeout,
    ...extra,
  };
  return { window, link, revoked, time: fake.time };
};

const rejecting = (name: string) => () => Promise.reject(new DOMException('', name));

test('routes, best first', () => {
  const share = () => Promise.resolve();
  const picker = rejecting('AbortError');
  expect(fileRoutes(file, setUp().window)).toEqual(['download']);
  expect(fileRoutes(file, setUp({ showSaveFilePicker: picker }).window)).toEqual(['picker', 'download']);
  expect(fileRoutes(file, setUp({ navigator: { share, canShare: () => false } }).window)).toEqual(['download']);
  const homeScreen = { share, canShare: () => true, standalone: true };
  expect(fileRoutes(file, setUp({ navigator: homeScreen }).window)).toEqual(['share']);
  expect(fileRoutes(file, setUp({ navigator: { standalone: true } }).window)).toEqual(['download']);
});

test('a chosen place: written, closed, saved', async () => {
  const done: string[] = [];
  const { window } = setUp({
    showSaveFilePicker: (options) => {
      done.push(options.suggestedName);
      return Promise.resolve({
        createWritable: () =>
          Promise.resolve({
            write: async (data: Blob) => void done.push(await data.text()),
            close: () => Promise.resolve(void done.push('closed')),
          }),
      });
    },
  });
  expect(await saveFile(file, 'picker', window)).toBe('saved');
  expect(done).toEqual(['shift.jsonl', 'one line\n', 'closed']);
});

test('the share sheet gets the file', async () => {
  const shared: string[] = [];
  const navigator = {
    share: (data: { files: File[] }) => Promise.resolve(void shared.push(...data.files.map((f) => f.name))),
  };
  expect(await saveFile(file, 'share', setUp({ navigator }).window)).toBe('shared');
  expect(shared).toEqual(['shift.jsonl']);
});

test('a download keeps its address long enough to be read', async () => {
  const { window, link, revoked, time } = setUp();
  expect(await saveFile(file, 'download', window)).toBe('downloaded');
  expect(link).toMatchObject({ href: 'blob:one', download: 'shift.jsonl', clicks: 1 });
  time.pass(59_999);
  expect(revoked).toEqual([]);
  time.pass(1);
  expect(revoked).toEqual(['blob:one']);
});

test.each([
  ['AbortError', 'cancelled'],
  ['NotAllowedError', 'tap again'],
  ['SecurityError', 'tap again'],
  ['QuotaExceededError', 'failed'],
])('%s means %s', async (name, outcome) => {
  expect(await saveFile(file, 'picker', setUp({ showSaveFilePicker: rejecting(name) }).window)).toBe(outcome);
  expect(await saveFile(file, 'share', setUp({ navigator: { share: rejecting(name) } }).window)).toBe(outcome);
});

test('a route that is not there fails', async () => {
  expect(await saveFile(file, 'picker', setUp().window)).toBe('failed');
  expect(await saveFile(file, 'share', setUp().window)).toBe('failed');
});
