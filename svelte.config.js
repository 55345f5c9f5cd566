import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import adapter from '@sveltejs/adapter-static';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/**
 * Kit's generated root announces each page from an element hidden by a style attribute, which `style-src 'self'` refuses.
 * The same rule stands in app.css as a class.
 * @type {import('svelte/compiler').PreprocessorGroup}
 */
const announcerByClass = {
  name: 'announcer-by-class',
  markup: ({ content, filename }) =>
    filename?.includes('generated/root.svelte')
      ? { code: content.replace(/(id="svelte-announcer"[^>]*?) style="[^"]*"/, '$1 class="visually-hidden"') }
      : undefined
};

/** The same sources always bear the same version name, so that two builds of one commit are one version. */
function versionName() {
  const hash = createHash('sha256');
  const add = (/** @type {string} */ path) => {
    for (const entry of readdirSync(path, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))) {
      const child = `${path}/${entry.name}`;
      if (entry.isDirectory()) add(child);
      else hash.update(child).update(readFileSync(child));
    }
  };
  add('src');
  add('static');
  hash.update(readFileSync('package-lock.json'));
  const { version } = JSON.parse(readFileSync('package.json', 'utf8'));
  return `${version}-${process.env.EVENLOAD_VERSION_SUFFIX ?? ''}${hash.digest('hex').slice(0, 10)}`;
}

/** @type {import('@sveltejs/kit').Config} */
export default {
  preprocess: [announcerByClass, vitePreprocess()],
  compilerOptions: { runes: true },
  kit: {
    adapter: adapter({ pages: 'build', assets: 'build', fallback: 'index.html', strict: true }),
    // workbox-window registers the worker, so that an update waits for a tap.
    serviceWorker: { register: false },
    paths: { relative: false },
    version: { name: versionName(), pollInterval: 0 },
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
        'trusted-types': ['default', 'svelte-trusted-html']
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
