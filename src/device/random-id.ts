/** Digits and small letters without i, l, o and u, so that an id can be read out. */
const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';

export interface RandomSource {
  getRandomValues(bytes: Uint8Array<ArrayBuffer>): Uint8Array<ArrayBuffer>;
}

/**
 * A random id of 5 bits per character: 20 characters are 100 bits. Uses getRandomValues because randomUUID is
 * missing where a page was served without TLS.
 */
export function randomId(characters = 20, source: RandomSource = globalThis.crypto): string {
  const bytes = source.getRandomValues(new Uint8Array(characters));
  return Array.from(bytes, (byte) => alphabet.charAt(byte & 31)).join('');
}
