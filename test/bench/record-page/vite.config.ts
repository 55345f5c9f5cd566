import { svelte } from '@sveltejs/vite-plugin-svelte';
import { defineConfig } from 'vite';

/** Builds a bare page over the app's own journal and import, for npm run bench:record. */
export default defineConfig({
  root: 'test/bench/record-page',
  base: './',
  plugins: [svelte({ configFile: false, compilerOptions: { runes: true } })],
  define: { __APP_VERSION__: JSON.stringify('0.0.0-test') },
  worker: { format: 'es' },
  build: {
    target: 'es2023',
    outDir: '../../../node_modules/.record-bench',
    emptyOutDir: true,
    // The app's own policy lets its workers through by where they lie.
    assetsDir: '_app/immutable',
    modulePreload: { polyfill: false }
  }
});
