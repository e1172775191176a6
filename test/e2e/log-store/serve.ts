import { createServer } from 'node:http';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';

/** The page's modules bundled as the app's are, but without the app. */
async function bundled(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'warn',
    build: {
      lib: { entry: fileURLToPath(new URL('./page.ts', import.meta.url)), formats: ['es'], fileName: 'page' },
      minify: false,
      write: false,
    },
  });
  const [bundle] = Array.isArray(built) ? built : [built];
  if (bundle === undefined || !('output' in bundle)) throw new Error('the bundler gave no output');
  return bundle.output[0].code;
}

/** Serves the page on a free port of this computer until it is closed. */
export async function servePage(): Promise<{ address: string; close: () => void }> {
  const code = await bundled();
  const server = createServer((request, response) => {
    if (request.url === '/page.js') {
      response.setHeader('content-type', 'text/javascript').end(code);
    } else {
      response
        .setHeader('content-type', 'text/html')
        .end(
          '<!doctype html><title>Log store</title><script type="module">window.page = await import("/page.js")</script>',
        );
    }
  });
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', listening));
  const where = server.address();
  if (where === null || typeof where === 'string') throw new Error('the server has no port');
  return { address: `http://localhost:${where.port}/`, close: () => server.close() };
}
