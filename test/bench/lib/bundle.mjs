import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'vite';

/**
 * Bundles a TypeScript module as the app is bundled; answers with the file. Through Vite's module runner every call
 * between modules would go by way of a getter, and the runner would be measured with it.
 * @param {{ root: string, folder: string }} context
 * @param {string} path from the root of the checkout
 */
export async function bundle({ root, folder }, path) {
  const name = `${path.replace(/\W+/g, '-')}.mjs`;
  await build({
    root,
    configFile: false,
    logLevel: 'error',
    ssr: { noExternal: true },
    build: {
      ssr: join(root, path),
      outDir: join(folder, 'bundled'),
      emptyOutDir: false,
      target: 'node20',
      minify: false,
      rolldownOptions: { output: { entryFileNames: name } },
    },
  });
  return join(folder, 'bundled', name);
}

/**
 * @template {Record<string, unknown>} Module
 * @param {{ root: string, folder: string }} context
 * @param {string} path from the root of the checkout
 * @returns {Promise<Module>}
 */
export async function importBundled(context, path) {
  return import(pathToFileURL(await bundle(context, path)).href);
}
