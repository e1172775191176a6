import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'vite';

/**
 * Bundles a TypeScript module as the app is bundled and imports it. Through Vite's module runner every call between
 * modules would go by way of a getter, and the runner would be measured with it.
 * @template {Record<string, unknown>} Module
 * @param {{ root: string, folder: string }} context
 * @param {string} path from the root of the checkout
 * @returns {Promise<Module>}
 */
export async function importBundled({ root, folder }, path) {
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
  return import(pathToFileURL(join(folder, 'bundled', name)).href);
}
