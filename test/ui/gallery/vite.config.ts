import { svelte } from '@sveltejs/vite-plugin-svelte';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

/** A page for looking at the components; no part of the product. */
export default defineConfig({
  root: fileURLToPath(new URL('.', import.meta.url)),
  plugins: [svelte({ configFile: false, compilerOptions: { runes: true } })],
  build: {
    outDir: process.env.GALLERY_OUT ?? fileURLToPath(new URL('../../../.cache/gallery', import.meta.url)),
    emptyOutDir: true,
    assetsInlineLimit: 0,
    target: 'es2022',
  },
});
