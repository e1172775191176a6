/**
 * The floor of saving: a strict compare-and-append and nothing else. Runs in the page, where it opens its own database
 * of the same profile once; answers with ms from asking until the transaction is complete.
 * @param {{ text: string }} line as long as one of the app
 * @returns {Promise<number>}
 */
export async function bareAppend({ text }) {
  /** @type {{ bareDatabase?: Promise<IDBDatabase>, bareSeq?: number }} */
  const kept = /** @type {never} */ (globalThis);
  kept.bareDatabase ??= new Promise((resolve, reject) => {
    const opening = indexedDB.open('bare-append', 1);
    opening.onupgradeneeded = () => {
      opening.result.createObjectStore('lines', { keyPath: ['log', 'seq'] });
      opening.result.createObjectStore('heads', { keyPath: 'log' });
    };
    opening.onerror = () => reject(opening.error);
    opening.onsuccess = () => resolve(opening.result);
  });
  const database = await kept.bareDatabase;
  kept.bareSeq ??= await new Promise((resolve, reject) => {
    const asked = database.transaction(['heads']).objectStore('heads').get('bare');
    asked.onerror = () => reject(asked.error);
    asked.onsuccess = () => resolve(asked.result?.seq ?? 0);
  });
  const expected = kept.bareSeq;
  const begun = performance.now();
  await new Promise((resolve, reject) => {
    const transaction = database.transaction(['lines', 'heads'], 'readwrite', { durability: 'strict' });
    const heads = transaction.objectStore('heads');
    const asked = heads.get('bare');
    asked.onsuccess = () => {
      if ((asked.result?.seq ?? 0) !== expected) {
        transaction.abort();
        return;
      }
      transaction.objectStore('lines').put({ log: 'bare', seq: expected + 1, batch: 'bare', text });
      heads.put({ log: 'bare', seq: expected + 1, hash: '0'.repeat(64) });
      transaction.commit();
    };
    transaction.onabort = () => reject(transaction.error ?? new Error('the head had moved'));
    transaction.oncomplete = resolve;
  });
  const ms = performance.now() - begun;
  kept.bareSeq = expected + 1;
  return ms;
}
