import { createServer } from 'node:net';
import { networkInterfaces } from 'node:os';
import { Refusal, codeOf } from './say.mjs';

/** A name for this machine alone stands for both of its loopback addresses: a browser may try either first. */
const loopback = ['127.0.0.1', '::1'];
const everywhere = ['0.0.0.0', '::'];

/** @param {string} host */
export function addressesOf(host) {
  return host === 'localhost' ? loopback : [host];
}

/** @param {string} host */
export function isOnlyThisMachine(host) {
  return host === 'localhost' || loopback.includes(host);
}

/**
 * What a person types to reach it. A wildcard is no address, so the machine's first one in the network stands for it.
 * @param {string} host
 */
export function nameOf(host) {
  if (!everywhere.includes(host)) return host.includes(':') ? `[${host}]` : host;
  const own = Object.values(networkInterfaces()).flatMap((each) => each ?? []);
  return own.find((each) => each.family === 'IPv4' && !each.internal)?.address ?? 'localhost';
}

/**
 * The sentence for a server that could not listen.
 * @param {unknown} error
 * @param {string} host
 * @param {number} port
 */
export function whyNotListening(error, host, port) {
  const code = codeOf(error);
  if (code === 'EADDRINUSE') {
    return new Refusal(`Port ${port} is already in use: stop what runs there, or choose another with --port.`);
  }
  if (code === 'EACCES') return new Refusal(`Port ${port} may not be used by this account: choose one above 1023.`);
  if (code === 'EADDRNOTAVAIL' || code === 'ENOTFOUND') {
    return new Refusal(`This machine has no address ${host}: give --host one of its own, or 0.0.0.0 for all.`);
  }
  return new Refusal(`Port ${port} at ${host} cannot be used (${code || String(error)}).`);
}

/**
 * Opens a server on one address. A machine without IPv6 has no second loopback address, and that is no fault.
 * @template {import('node:net').Server} Server
 * @param {Server} server
 * @param {string} address
 * @param {number} port
 * @returns {Promise<Server | null>} null where the machine lacks that loopback address
 */
export function listen(server, address, port) {
  return new Promise((done, refuse) => {
    server.once('error', (error) => {
      const lacking = address === '::1' && ['EADDRNOTAVAIL', 'EAFNOSUPPORT'].includes(codeOf(error));
      if (lacking) done(null);
      else refuse(error);
    });
    server.listen({ host: address, port, ipv6Only: address === '::1' }, () => done(server));
  });
}

/**
 * Refuses early, before a build that nobody could see.
 * @param {string} host
 * @param {number} port
 */
export async function refuseTakenPort(host, port) {
  for (const address of addressesOf(host)) {
    try {
      const server = await listen(createServer(), address, port);
      if (server !== null) await new Promise((done) => server.close(done));
    } catch (error) {
      throw whyNotListening(error, host, port);
    }
  }
}
