import { isAbsolute, join } from 'node:path';
import { root } from './paths.mjs';

/**
 * Imports a TypeScript module of this project into this process, by Vite's module runner: Node 20 runs no TypeScript.
 * @template {Record<string, unknown>} Module
 * @param {string} path from the root of the checkout
 * @returns {Promise<Module>}
 */
export async function importTypescript(path) {
  const { runnerImport } = await import('vite');
  const file = isAbsolute(path) ? path : join(root, path);
  const { module } = await runnerImport(file, { root, configFile: false, logLevel: 'error' });
  return /** @type {Module} */ (module);
}
