import { refuseOldNode } from './lib/node-version.mjs';
import { main, say } from './lib/say.mjs';

// Only what Node brings may be imported before the packages are installed.
await main(async () => {
  refuseOldNode();
  const { help, readStartOptions } = await import('./lib/start-options.mjs');
  const options = readStartOptions(process.argv.slice(2));
  if (options.help) return say(help);

  const { readCertificate } = await import('./lib/certificate.mjs');
  const { isOnlyThisMachine, refuseTakenPort } = await import('./lib/port.mjs');
  const { buildFolder } = await import('./lib/paths.mjs');
  const { host, port, base } = options;
  const tls = readCertificate(options.cert, options.key);
  if (!options['build-only']) await refuseTakenPort(host, port);

  if (!options['no-build']) {
    const { ensureInstalled } = await import('./lib/install.mjs');
    const { ensureBuilt } = await import('./lib/build.mjs');
    await ensureInstalled();
    await ensureBuilt({ base });
  }
  if (options['build-only']) return say(`The app stands in ${buildFolder}`);

  const { serve } = await import('./lib/serve.mjs');
  const serving = await serve({ folder: buildFolder, host, port, base, tls });
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM'])) {
    process.once(signal, () => void serving.close().then(() => process.exit(0)));
  }
  say(`Lintfree is at ${serving.address}`);
  if (tls === null && !isOnlyThisMachine(host)) {
    say('A tablet that reaches it over plain http cannot keep it for offline use: see README.md, "On a tablet".');
  }
});
