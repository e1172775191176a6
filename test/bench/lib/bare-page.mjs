import { mkdirSync, symlinkSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The smallest page of the same framework, adapter and router: one button that counts. */
const files = {
  'package.json': '{ "private": true, "type": "module" }\n',
  'svelte.config.js': `import adapter from '@sveltejs/adapter-static';
export default {
  compilerOptions: { runes: true },
  kit: {
    adapter: adapter({ strict: true }),
    router: { type: 'hash' },
    serviceWorker: { register: false },
    version: { name: 'bare', pollInterval: 0 },
  },
};
`,
  'vite.config.js': `import { sveltekit } from '@sveltejs/kit/vite';
export default { plugins: [sveltekit()], build: { assetsInlineLimit: 0 } };
`,
  'src/app.html': `<!doctype html>
<html lang="en">
  <head><meta charset="utf-8" /><link rel="icon" href="data:," />%sveltekit.head%</head>
  <body><div style="display: contents">%sveltekit.body%</div></body>
</html>
`,
  'src/routes/+page.svelte': `<script>
  let count = $state(0);
</script>

<button onclick={() => (count += 1)}>{count}</button>
`,
};

/**
 * Builds it with what is installed here; answers with the folder that it stands in.
 * @param {Pick<import('../../../.ci/bench.mjs').Context, 'root' | 'folder' | 'runInstalled'>} context
 */
export async function buildBarePage({ root, folder, runInstalled }) {
  const project = join(folder, 'bare');
  for (const [name, content] of Object.entries(files)) {
    mkdirSync(dirname(join(project, name)), { recursive: true });
    writeFileSync(join(project, name), content);
  }
  symlinkSync(join(root, 'node_modules'), join(project, 'node_modules'), 'junction');
  const { code, output } = await runInstalled(['vite'], ['build', '--logLevel', 'warn'], {
    folder: project,
    limitS: 120,
    env: { NODE_ENV: 'production', VITEST: '' },
  });
  if (code !== 0) throw new Error(`the bare page could not be built:\n${output}`);
  return join(project, 'build');
}
