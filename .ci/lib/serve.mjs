import { existsSync } from 'node:fs';
import { createServer as createPlainServer } from 'node:http';
import { createServer as createSecureServer } from 'node:https';
import { join } from 'node:path';
import sirv from 'sirv';
import { cacheControl, securityHeaders } from './headers.mjs';
import { addressesOf, listen, nameOf, whyNotListening } from './port.mjs';
import { Refusal } from './say.mjs';

/**
 * The path below the base, decoded; null where it is outside.
 * @param {string} url
 * @param {string} base
 */
function pathBelow(url, base) {
  const path = url.replace(/[?#].*$/, '');
  if (base !== '' && !path.startsWith(`${base}/`)) return null;
  try {
    return decodeURI(path.slice(base.length));
  } catch {
    return null;
  }
}

/**
 * @param {string} folder
 * @param {string} base
 * @returns {import('node:http').RequestListener}
 */
function answering(folder, base) {
  // Looked up at each request, so that a build swapped in under a running server is served whole.
  const files = sirv(folder, { dev: true, etag: true });
  return (request, response) => {
    for (const [name, value] of Object.entries(securityHeaders)) response.setHeader(name, value);
    response.setHeader('Cache-Control', 'no-cache');
    const url = request.url ?? '/';
    /** @type {(status: number, sentence: string, more?: Record<string, string>) => void} */
    const say = (status, sentence, more = {}) => {
      response.setHeader('Cache-Control', 'no-cache');
      response.writeHead(status, { 'Content-Type': 'text/plain; charset=utf-8', ...more });
      response.end(`${sentence}\n`);
    };
    if (request.method !== 'GET' && request.method !== 'HEAD') return say(405, 'Only GET.', { Allow: 'GET, HEAD' });
    if (base !== '' && (url === '/' || url === base)) return say(302, 'It stands here.', { Location: `${base}/` });
    const path = pathBelow(url, base);
    if (path === null || /\/\./.test(path)) return say(404, 'Not found.');
    response.setHeader('Cache-Control', cacheControl(path));
    request.url = url.slice(base.length);
    return files(request, response, () => say(404, 'Not found.'));
  };
}

/**
 * @typedef {object} Serving
 * @property {string} address without a slash at its end, the base included
 * @property {() => Promise<void>} close resolves when the port is free again; open connections are cut
 */

/**
 * Serves a finished build.
 * @param {{ folder: string, host?: string, port?: number, base?: string, tls?: { cert: Buffer, key: Buffer } | null }} what
 *   port 0 takes any free one
 * @returns {Promise<Serving>}
 */
export async function serve({ folder, host = 'localhost', port = 4173, base = '', tls = null }) {
  if (!existsSync(join(folder, 'index.html'))) throw new Refusal(`There is no build in ${folder} to serve.`);
  const answer = answering(folder, base);
  /** @type {import('node:http').Server[]} */
  const servers = [];
  const close = async () => {
    await Promise.all(
      servers.map((server) => {
        const closed = new Promise((done) => server.close(done));
        server.closeAllConnections();
        return closed;
      }),
    );
  };
  let chosen = port;
  try {
    for (const address of addressesOf(host)) {
      const server = await listen(tls ? createSecureServer(tls, answer) : createPlainServer(answer), address, chosen);
      if (server === null) continue;
      servers.push(server);
      const bound = server.address();
      if (bound !== null && typeof bound === 'object') chosen = bound.port;
    }
  } catch (error) {
    await close();
    throw whyNotListening(error, host, chosen);
  }
  return { address: `${tls ? 'https' : 'http'}://${nameOf(host)}:${chosen}${base}`, close };
}
