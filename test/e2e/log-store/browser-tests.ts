import { deleteDB, openDB } from 'idb';
import { databaseVersion, openDatabase, removeDatabase } from '../../../src/log/database.ts';
import { StoreError } from '../../../src/log/errors.ts';
import { openIndexedDbStore } from '../../../src/log/indexed-db-store.ts';
import { steadyStore } from '../../../src/log/steady-store.ts';
import type { LogStore } from '../../../src/log/store.ts';
import { equal, failureOf, type Runner } from '../../contract/expect.ts';
import { held, linesAfter } from '../../contract/lines-to-store.ts';

const first = linesAfter(null, [held('b1', 'lunch')]);
const second = linesAfter(first.head, [held('b1', 'fire drill')]);
const ignore = () => {};

async function faultOf(promise: Promise<unknown>): Promise<string> {
  const failure = await failureOf(promise);
  return failure instanceof StoreError ? failure.fault.kind : failure.message;
}

/** What only a browser's own database can show. Each test takes a database name of its own. */
export function browserTests({ test }: Runner): void {
  test('a database of a newer version is refused in words, and left as it is', async () => {
    const newer = await openDB('newer', databaseVersion + 1, {
      upgrade: (database) => void database.createObjectStore('later').put('kept', 'key'),
    });
    newer.close();
    const failure = await failureOf(openIndexedDbStore('newer', ignore));
    equal(failure.message, 'This database was written by a newer version. Update the app; nothing was changed.');
    equal(await faultOf(steadyStore((gone) => openIndexedDbStore('newer', gone)).heads()), 'newer');
    const still = await openDB('newer');
    equal([still.version, await still.get('later', 'key')], [databaseVersion + 1, 'kept']);
    still.close();
  });

  test('a newer version gets in at once: the older connection closes and says so', async () => {
    const went: string[] = [];
    const store = await openIndexedDbStore('gives-way', (why) => went.push(why));
    await store.append(null, first.lines, first.head, []);
    const newer = await openDB('gives-way', databaseVersion + 1, { blocked: () => went.push('blocked') });
    equal(went, ['newer version']);
    equal(await faultOf(store.count()), 'broken');
    newer.close();
  });

  test('an older version that will not let go is named, and does not hold the next opening up', async () => {
    const stubborn = await openDB('stubborn', 1);
    equal(await faultOf(openDatabase('stubborn', ignore, 2)), 'blocked');
    stubborn.close();
    const opened = await openDatabase('stubborn', ignore, 2);
    opened.close();
    const later = await openDB('stubborn', 3, { blocked: () => equal('blocked', 'not blocked') });
    later.close();
  });

  test('a database is removed with all that is in it, unless another window holds it', async () => {
    const store = await openIndexedDbStore('lintfree-demo', ignore);
    await store.append(null, first.lines, first.head, []);
    store.close();
    await removeDatabase('lintfree-demo');
    equal((await indexedDB.databases()).filter(({ name }) => name === 'lintfree-demo').length, 0);
    const anew = await openIndexedDbStore('lintfree-demo', ignore);
    equal(await anew.count(), 0);
    anew.close();
    const stubborn = await openDB('held', 1);
    equal(await faultOf(removeDatabase('held')), 'blocked');
    stubborn.close();
  });

  test('a dead handle is thrown away, and the append is saved through a new one', async () => {
    const handles: LogStore[] = [];
    const store = steadyStore(async (gone) => {
      const handle = await openIndexedDbStore('dead-handle', gone);
      handles.push(handle);
      return handle;
    });
    await store.append(null, first.lines, first.head, []);
    handles[0]?.close();
    equal(await store.append(first.head, second.lines, second.head, []), 'saved');
    equal([handles.length, await store.count(), store.unsaved().length], [2, 2, 0]);
    store.close();
  });

  test('a database that was removed under the store is told as moved, not mended in silence', async () => {
    const went: string[] = [];
    const store = steadyStore((gone) => openIndexedDbStore('wiped', gone), { gone: (why) => went.push(why) });
    await store.append(null, first.lines, first.head, []);
    await deleteDB('wiped');
    equal(went, ['removed']);
    equal(await store.append(first.head, second.lines, second.head, []), 'moved');
    equal(await store.count(), 0);
    store.close();
  });
}
