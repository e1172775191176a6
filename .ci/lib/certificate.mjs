import { readFileSync } from 'node:fs';
import { createSecureContext } from 'node:tls';
import { Refusal, codeOf } from './say.mjs';

/**
 * @param {string} what
 * @param {string} file
 */
function read(what, file) {
  try {
    return readFileSync(file);
  } catch (error) {
    throw new Refusal(`The ${what} ${file} cannot be read (${codeOf(error)}).`);
  }
}

/**
 * A certificate and its key, read and tried together.
 * @param {string | undefined} certFile PEM
 * @param {string | undefined} keyFile PEM
 * @returns {{ cert: Buffer, key: Buffer } | null} null where neither is named
 */
export function readCertificate(certFile, keyFile) {
  if (certFile === undefined && keyFile === undefined) return null;
  if (certFile === undefined || keyFile === undefined) {
    throw new Refusal('--cert and --key go together: name both files, or neither.', 2);
  }
  const pair = { cert: read('certificate', certFile), key: read('key', keyFile) };
  try {
    createSecureContext(pair);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    throw new Refusal(`${certFile} and ${keyFile} are not a certificate and its key in PEM form (${why}).`);
  }
  return pair;
}
