import { svelte } from '@sveltejs/vite-plugin-svelte';
import type { UserConfig } from 'vite';

/** Builds a bare page over the app's own journal and import, without the screens, into node_modules/`out`. */
export const barePage = (root: string, out: string): UserConfig => ({
  root,
  base: './',
  plugins: [svelte({ configFile: false, compilerOptions: { runes: true } })],
  define: { __APP_VERSION__: JSON.stringify('0.0.0-test') },
  worker: { format: 'es' },
  build: {
    target: 'es2023',
    outDir: `../../../node_modules/${out}`,
    emptyOutDir: true,
    // The app's own policy lets its workers through by where they lie.
    assetsDir: '_app/immutable',
    modulePreload: { polyfill: false }
  }
});
