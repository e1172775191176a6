import adapter from '@sveltejs/adapter-static';

/** The version names the build: it must change with every change of content, or no update is offered to a tablet. */
const version = process.env.LINTFREE_VERSION ?? 'dev';
/** The path under which the app stands, such as /lintfree. */
const base = /** @type {'' | `/${string}`} */ (process.env.LINTFREE_BASE ?? '');

/** @type {import('@sveltejs/kit').Config} */
export default {
  compilerOptions: { runes: true },
  kit: {
    // A build works in a folder of its own, so that it disturbs neither a running `npm run dev` nor the type checks.
    outDir: process.env.LINTFREE_KIT ?? '.svelte-kit',
    adapter: adapter({ pages: process.env.LINTFREE_OUT ?? 'build', strict: true }),
    router: { type: 'hash' },
    serviceWorker: { register: false },
    version: { name: version, pollInterval: 0 },
    paths: { base, relative: true },
    csp: {
      mode: 'hash',
      directives: {
        'default-src': ['self'],
        'script-src': ['self'],
        'style-src': ['self'],
        'style-src-attr': ['unsafe-inline'],
        'img-src': ['self', 'data:', 'blob:'],
        'font-src': ['self'],
        'worker-src': ['self'],
        'connect-src': ['self'],
        'object-src': ['none'],
        'base-uri': ['none'],
        'form-action': ['none'],
      },
    },
  },
};
