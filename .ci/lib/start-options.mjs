import { parseArgs } from 'node:util';
import { Refusal } from './say.mjs';

export const help = `npm start -- [options]

Installs what is missing, builds if something changed, and serves Lintfree.

  --host NAME    address to listen at (localhost; 0.0.0.0 for every address of this machine)
  --port NUMBER  port to listen at (4173)
  --cert FILE    certificate in PEM form; with --key it serves over https, which tablets need
  --key FILE     the certificate's key in PEM form
  --base PATH    path under which the app stands, such as /lintfree (none: at the root)
  --build-only   build and stop; the folder build/ can then be copied to any static file server
  --no-build     serve what was built before, without looking at the sources
  --help         this text`;

/** @param {string[]} args */
function parse(args) {
  try {
    return parseArgs({
      args,
      options: {
        host: { type: 'string', default: 'localhost' },
        port: { type: 'string', default: '4173' },
        cert: { type: 'string' },
        key: { type: 'string' },
        base: { type: 'string', default: '' },
        'build-only': { type: 'boolean', default: false },
        'no-build': { type: 'boolean', default: false },
        help: { type: 'boolean', default: false },
      },
    }).values;
  } catch (error) {
    const why = error instanceof Error ? error.message.replace(/\.(\s.*)?$/s, '') : String(error);
    throw new Refusal(`${why}: npm start -- --help lists the options.`, 2);
  }
}

/**
 * @param {string[]} args
 * @throws {Refusal} with exit code 2
 */
export function readStartOptions(args) {
  const { port: portText, base: basePath, ...rest } = parse(args);
  const port = Number(portText);
  if (!/^\d+$/.test(portText) || port > 65535) {
    throw new Refusal(`--port ${portText} is no port: give a whole number from 0 to 65535 (0 takes any free one).`, 2);
  }
  const base = basePath.replace(/\/+$/, '');
  if (!/^(\/[\w.~-]+)*$/.test(base)) throw new Refusal(`--base ${basePath} is no path such as /lintfree.`, 2);
  if (rest.host === '') throw new Refusal('--host is empty: give a name or an address.', 2);
  if (rest['build-only'] && rest['no-build']) throw new Refusal('--build-only and --no-build leave nothing to do.', 2);
  return { ...rest, port, base };
}
