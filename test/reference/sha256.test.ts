import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { hashOfNothing, sha256 } from '../../src/core/event/hash.ts';

const published = [
  {
    source: 'NIST CAVP, SHA256ShortMsg.rsp, Len = 0',
    message: '',
    hash: 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855',
  },
  {
    source: 'FIPS 180-2 appendix B.1, one block',
    message: 'abc',
    hash: 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  },
  {
    source: 'FIPS 180-2 appendix B.2, 448 bits, two blocks',
    message: 'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
    hash: '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
  },
  {
    source: 'FIPS 180-2 appendix B.3, a million times "a"',
    message: 'a'.repeat(1_000_000),
    hash: 'cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0',
  },
];

test.each(published)('$source', ({ message, hash }) => {
  expect(sha256(message)).toBe(hash);
});

test('the first line of a log follows the hash of nothing', () => {
  expect(hashOfNothing).toBe(published[0]?.hash);
});

test.each(['µm', '8° APC, 62,5 µm', '光', '🔬 400×', 'a\u0000b\u2028c'])(
  'UTF-8 of %j as the platform hashes it',
  (message) => {
    expect(sha256(message)).toBe(createHash('sha256').update(message, 'utf8').digest('hex'));
  },
);
