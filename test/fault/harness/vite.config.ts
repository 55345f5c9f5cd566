import { svelte } from '@sveltejs/vite-plugin-svelte';
import { defineConfig } from 'vite';

/** Builds a bare page over the app's own journal: what the fault tests and the record's benchmark press on. */
export default defineConfig({
  root: 'test/fault/harness',
  base: './',
  plugins: [svelte({ configFile: false, compilerOptions: { runes: true } })],
  define: { __APP_VERSION__: JSON.stringify('0.0.0-test') },
  worker: { format: 'es' },
  build: {
    target: 'es2023',
    outDir: '../../../node_modules/.fault-harness',
    emptyOutDir: true,
    // The app's own policy lets its workers through by where they lie.
    assetsDir: '_app/immutable',
    modulePreload: { polyfill: false }
  }
});
