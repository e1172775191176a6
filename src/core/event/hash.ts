import { sha256 as digest } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/** SHA-256 (FIPS 180-4) of a text's UTF-8 bytes, as 64 lower-case hex digits. */
export function sha256(text: string): string {
  return bytesToHex(digest(utf8ToBytes(text)));
}

/** What `prev` says on the first line of a log: the SHA-256 of nothing. */
export const hashOfNothing = sha256('');
