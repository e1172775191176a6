import { spawn } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { refuseOldNode } from './lib/node-version.mjs';
import { Refusal, main } from './lib/say.mjs';

await main(async () => {
  refuseOldNode();
  const { ensureInstalled } = await import('./lib/install.mjs');
  await ensureInstalled();
  const { root } = await import('./lib/paths.mjs');
  const { programOf } = await import('./lib/command.mjs');
  const folder = join(root, 'test', 'endurance');
  const suites = existsSync(folder) ? readdirSync(folder, { recursive: true }).map(String) : [];
  if (!suites.some((each) => each.endsWith('.test.ts'))) {
    throw new Refusal('There is no slow suite: none of test/endurance/ ends in .test.ts.');
  }
  const child = spawn(process.execPath, [programOf('vitest'), 'run', ...process.argv.slice(2)], {
    cwd: root,
    env: { ...process.env, LINTFREE_ENDURANCE: '1' },
    stdio: 'inherit',
  });
  return new Promise((done) => child.on('close', (code) => done(code ?? 1)));
});
