import { spawn, spawnSync, type ChildProcess } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { request as requestPlain, type IncomingMessage } from 'node:http';
import { request as requestSecure } from 'node:https';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, afterEach, describe, expect, test } from 'vitest';

const script = fileURLToPath(new URL('../../.ci/start.mjs', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'lintfree-start-'));
const build = join(folder, 'build');
const files = {
  'index.html': '<!doctype html><title>Fixture</title>',
  'service-worker.js': '// worker',
  'manifest.webmanifest': '{}',
  '_app/immutable/entry/a.js': 'export {};',
  '.lintfree-build': 'stamp',
  '../outside.txt': 'outside',
};
mkdirSync(join(build, '_app/immutable/entry'), { recursive: true });
for (const [name, text] of Object.entries(files)) writeFileSync(join(build, name), text);

const children: ChildProcess[] = [];
afterEach(() => children.splice(0).forEach((child) => child.kill('SIGKILL')));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const env = { ...process.env, LINTFREE_BUILD: build };

/** Starts the server and waits for the line that names its address. */
function start(...args: string[]): Promise<{ line: string; address: string; child: ChildProcess }> {
  const child = spawn(process.execPath, [script, '--no-build', ...args], { env });
  children.push(child);
  return new Promise((done, fail) => {
    let output = '';
    const listen = (text: Buffer) => {
      output += text.toString();
      const line = output.split('\n').find((each) => each.startsWith('Lintfree is at '));
      if (line !== undefined) done({ line, address: line.replace('Lintfree is at ', ''), child });
    };
    child.stdout.on('data', listen);
    child.stderr.on('data', listen);
    child.on('close', () => fail(new Error(output)));
  });
}

/** Runs the script to its end, which it must reach by itself. */
function refusal(...args: string[]) {
  const { status, stderr } = spawnSync(process.execPath, [script, '--no-build', ...args], { env, encoding: 'utf8' });
  return { status, sentence: stderr.trim() };
}

interface Answer {
  readonly status: number | undefined;
  readonly headers: IncomingMessage['headers'];
  readonly body: string;
}

/** The path is sent as it stands: a URL parser would tidy away what these tests are about. */
function ask(address: string, path: string, method = 'GET', host?: string): Promise<Answer> {
  const { protocol, port } = new URL(address);
  const request = protocol === 'https:' ? requestSecure : requestPlain;
  return new Promise((done, fail) => {
    request({ host: host ?? 'localhost', port, path, method, rejectUnauthorized: false, agent: false }, (answer) => {
      let body = '';
      answer.on('data', (text: Buffer) => (body += text.toString()));
      answer.on('end', () => done({ status: answer.statusCode, headers: answer.headers, body }));
    })
      .on('error', fail)
      .end();
  });
}

describe('npm start serves a build', () => {
  test('names its address in one line and ends when told to', async () => {
    const { line, child } = await start('--port', '0');
    expect(line).toMatch(/^Lintfree is at http:\/\/localhost:\d+$/);
    const ended = new Promise((done) => child.on('close', done));
    child.kill('SIGTERM');
    expect(await ended).toBe(0);
  });

  test('every answer carries the security headers, a refusal too', async () => {
    const { address } = await start('--port', '0');
    const answers = [await ask(address, '/'), await ask(address, '/nowhere'), await ask(address, '/', 'POST')];
    expect(answers.map((each) => each.status)).toEqual([200, 404, 405]);
    for (const { headers } of answers) {
      expect(headers).toMatchObject({
        'content-security-policy': "frame-ancestors 'none'",
        'cross-origin-opener-policy': 'same-origin',
        'referrer-policy': 'no-referrer',
        'x-content-type-options': 'nosniff',
      });
      expect(headers['permissions-policy']).toContain('screen-wake-lock=(self)');
      expect(headers['permissions-policy']).toContain('camera=()');
    }
  });

  test('only files that carry their hash are kept without asking again', async () => {
    const { address } = await start('--port', '0');
    const control = async (path: string) => (await ask(address, path)).headers['cache-control'];
    expect(await control('/_app/immutable/entry/a.js')).toContain('immutable');
    expect(await control('/_app/immutable/entry/gone.js')).toBe('no-cache');
    expect(await control('/')).toBe('no-cache');
    expect(await control('/service-worker.js')).toBe('no-cache');
  });

  test('types fit, and an unchanged file is not sent twice', async () => {
    const { address } = await start('--port', '0');
    const page = await ask(address, '/');
    expect(page.body).toBe(files['index.html']);
    expect(page.headers['content-type']).toContain('text/html');
    expect((await ask(address, '/manifest.webmanifest')).headers['content-type']).toContain(
      'application/manifest+json',
    );
    expect(page.headers.etag).toBeDefined();
  });

  test.each([
    '/../outside.txt',
    '/%2e%2e/outside.txt',
    '/_app/..%2f..%2f..%2foutside.txt',
    '/.lintfree-build',
    '/%2elintfree-build',
    '/%',
  ])('nothing outside the build and no dot-file: %s', async (path) => {
    const { address } = await start('--port', '0');
    const answer = await ask(address, path);
    expect(answer.status).toBe(404);
    expect(answer.body).toBe('Not found.\n');
  });

  test('a build swapped in while it runs is served whole', async () => {
    const { address } = await start('--port', '0');
    await ask(address, '/');
    writeFileSync(join(build, 'index.html'), '<!doctype html><title>A longer fixture than before</title>');
    writeFileSync(join(build, 'added.js'), '1');
    const [page, added] = [await ask(address, '/'), await ask(address, '/added.js')];
    writeFileSync(join(build, 'index.html'), files['index.html']);
    expect(page.body).toContain('longer');
    expect(added.status).toBe(200);
  });

  test('under a base path', async () => {
    const { address } = await start('--port', '0', '--base', '/lintfree/');
    expect(address).toMatch(/\/lintfree$/);
    expect((await ask(address, '/lintfree/')).body).toBe(files['index.html']);
    expect((await ask(address, '/lintfree/_app/immutable/entry/a.js')).headers['cache-control']).toContain('immutable');
    expect((await ask(address, '/')).headers.location).toBe('/lintfree/');
    expect((await ask(address, '/service-worker.js')).status).toBe(404);
  });

  test('localhost is both loopback addresses, another address is that alone', async () => {
    const both = await start('--port', '0');
    expect((await ask(both.address, '/', 'GET', '127.0.0.1')).status).toBe(200);
    const one = await start('--port', '0', '--host', '127.0.0.1');
    expect(one.address).toContain('127.0.0.1');
  });
});

describe('npm start refuses in one sentence', () => {
  test('a taken port', async () => {
    const { address } = await start('--port', '0');
    const { port } = new URL(address);
    expect(refusal('--port', port)).toEqual({
      status: 1,
      sentence: `Port ${port} is already in use: stop what runs there, or choose another with --port.`,
    });
  });

  test('a port that is taken on the other loopback address alone', async () => {
    const other = createServer();
    const port = await new Promise<number | null>((done) => {
      other.on('error', () => done(null));
      other.listen({ host: '::1', port: 0, ipv6Only: true }, () => {
        const bound = other.address();
        done(typeof bound === 'object' && bound !== null ? bound.port : null);
      });
    });
    if (port === null) return;
    expect(refusal('--port', String(port)).sentence).toContain('is already in use');
    other.close();
  });

  test.each([
    [['--prot', '1'], "Unknown option '--prot'"],
    [['--port', 'high'], '--port high is no port'],
    [['--port', '70000'], '--port 70000 is no port'],
    [['--port', '-1'], '--port'],
    [['bench'], "Unexpected argument 'bench'"],
    [['--base', 'lintfree'], '--base lintfree is no path'],
    [['--cert', 'a.pem'], '--cert and --key go together'],
    [['--build-only'], 'leave nothing to do'],
  ])('a wrong option: %j', (args, start) => {
    const { status, sentence } = refusal(...args);
    expect(status).toBe(2);
    expect(sentence).toContain(start);
    expect(sentence.split('\n')).toHaveLength(1);
  });

  test.each([
    [['--cert', '/nowhere.pem', '--key', '/nowhere.pem'], 'The certificate /nowhere.pem cannot be read (ENOENT).'],
    [['--cert', script, '--key', script], 'are not a certificate and its key in PEM form'],
    [['--host', '203.0.113.7', '--port', '0'], 'This machine has no address 203.0.113.7'],
  ])('what cannot be had: %j', (args, start) => {
    const { status, sentence } = refusal(...args);
    expect(status).toBe(1);
    expect(sentence).toContain(start);
    expect(sentence.split('\n')).toHaveLength(1);
  });

  test('no build to serve', () => {
    const empty = join(folder, 'empty');
    const { status, stderr } = spawnSync(process.execPath, [script, '--no-build', '--port', '0'], {
      env: { ...env, LINTFREE_BUILD: empty },
      encoding: 'utf8',
    });
    expect({ status, stderr }).toEqual({ status: 1, stderr: `There is no build in ${empty} to serve.\n` });
  });
});

const hasOpenssl = spawnSync('openssl', ['version']).status === 0;

describe.skipIf(!hasOpenssl)('over https', () => {
  const key = join(folder, 'key.pem');
  const cert = join(folder, 'cert.pem');

  test('with a certificate made here', async () => {
    const subject = ['-subj', '/CN=localhost', '-addext', 'subjectAltName=DNS:localhost', '-days', '2'];
    spawnSync('openssl', ['req', '-x509', '-newkey', 'rsa:2048', '-nodes', '-keyout', key, '-out', cert, ...subject]);
    expect(existsSync(cert)).toBe(true);
    const { address } = await start('--port', '0', '--cert', cert, '--key', key);
    expect(address).toMatch(/^https:\/\/localhost:\d+$/);
    expect((await ask(address, '/')).body).toBe(files['index.html']);
  });
});
