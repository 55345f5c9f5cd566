import adapter from '@sveltejs/adapter-static';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/** @type {import('@sveltejs/kit').Config} */
export default {
  preprocess: vitePreprocess(),
  compilerOptions: { runes: true },
  kit: {
    adapter: adapter({ pages: 'build', assets: 'build', fallback: 'index.html', strict: true }),
    // workbox-window registers the worker, so that an update waits for a tap.
    serviceWorker: { register: false },
    paths: { relative: false },
    csp: {
      mode: 'hash',
      directives: {
        'default-src': ['self'],
        'script-src': ['self', 'wasm-unsafe-eval'],
        'style-src': ['self'],
        'img-src': ['self', 'data:', 'blob:'],
        'media-src': ['self', 'blob:'],
        'worker-src': ['self'],
        'connect-src': ['self'],
        'object-src': ['none'],
        'base-uri': ['none'],
        'form-action': ['none'],
        'require-trusted-types-for': ['script'],
        'trusted-types': ['evenload', 'svelte-trusted-html']
      }
    },
    typescript: {
      config: (config) => ({
        ...config,
        include: [...config.include, '../test/**/*.ts', '../*.config.ts'],
        exclude: [...config.exclude, '../src/service-worker/**', '../src/cli/**']
      })
    }
  }
};
