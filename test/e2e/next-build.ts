import { createHash } from 'node:crypto';
import { cpSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** Paths of all files of a build, relative to it. */
export function filesOf(folder: string): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(folder.length + 1));
}

/** A script's name in the next build. Every name ends in a hash, so that none is a part of another. */
export const nextName = (name: string) => name.replace(/\.js$/, '-next.js');

/**
 * Copies a build as if every script had changed: other names, another version, the policy's hashes made again. A second
 * real build would take longer than all tests of the update together.
 */
export function makeNextBuild(from: string, to: string): void {
  cpSync(from, to, { recursive: true });
  const paths = filesOf(to);
  const renamed = paths.filter((path) => path.startsWith('_app/immutable/') && path.endsWith('.js'));
  const version = (JSON.parse(readFileSync(join(from, '_app/version.json'), 'utf8')) as { version: string }).version;
  for (const path of paths.filter((each) => /\.(js|html|json)$/.test(each))) {
    let text = readFileSync(join(to, path), 'utf8').replaceAll(version, `${version}-next`);
    for (const name of renamed.map((each) => each.slice(each.lastIndexOf('/')))) {
      text = text.replaceAll(name, nextName(name));
    }
    writeFileSync(join(to, path), path === 'index.html' ? withNewHashes(text) : text);
  }
  for (const path of renamed) renameSync(join(to, path), join(to, nextName(path)));
}

function withNewHashes(html: string): string {
  const scripts = [...html.matchAll(/<script>(.*?)<\/script>/gs)].map((match) => match[1] ?? '');
  const hashes = scripts.map((script) => `'sha256-${createHash('sha256').update(script).digest('base64')}'`);
  return html.replace(/script-src 'self'( 'sha256-[^']+')*/, ["script-src 'self'", ...hashes].join(' '));
}
