import { refuseOldNode } from './lib/node-version.mjs';
import { main } from './lib/say.mjs';

await main(async () => {
  refuseOldNode();
  const { ensureInstalled } = await import('./lib/install.mjs');
  await ensureInstalled();
  const { importTypescript } = await import('./lib/import-typescript.mjs');
  /** @type {{ main: (args: string[]) => Promise<number> }} */
  const recipes = await importTypescript('src/command-line/recipes.ts');
  return recipes.main(process.argv.slice(2));
});
