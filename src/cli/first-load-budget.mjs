import { gzipSync } from 'node:zlib';

/**
 * A build step that adds up the script a route loads first (Kit's entries, the layout, the page and all they import
 * statically) and fails the build above the budget, or when a package that must come later is in it.
 *
 * @param {{ route: string, kilobytes: number, without: string[] }} budget `route` is the folder under src/routes
 * @returns {import('vite').Plugin}
 */
export function firstLoadBudget({ route, kilobytes, without }) {
  return {
    name: 'first-load-budget',
    apply: 'build',
    generateBundle(_options, bundle) {
      /** @type {Map<string, { fileName: string, code: string, imports: string[], moduleIds: string[], isEntry: boolean }>} */
      const chunks = new Map();
      for (const output of Object.values(bundle)) if (output.type === 'chunk') chunks.set(output.fileName, output);
      const holds = (/** @type {string} */ suffix) =>
        [...chunks.values()].filter((chunk) => chunk.isEntry && chunk.moduleIds.some((id) => id.endsWith(suffix)));
      const page = holds(`/src/routes/${route}/+page.svelte`);
      const entries = [...chunks.values()].filter(
        ({ isEntry, fileName }) => isEntry && /\/entry\/(start|app)\./.test(fileName)
      );
      // Kit's server build passes here too and has no entry/start.
      if (entries.length === 0) return;
      if (page.length !== 1) this.error(`first-load budget: found ${page.length} entries for the route ${route}`);

      /** @type {Set<string>} */
      const loaded = new Set();
      const visit = (/** @type {string} */ name) => {
        const chunk = chunks.get(name);
        if (!chunk || loaded.has(name)) return;
        loaded.add(name);
        chunk.imports.forEach(visit);
      };
      [...entries, ...holds('/src/routes/+layout.svelte'), ...page].forEach(({ fileName }) => visit(fileName));

      let bytes = 0;
      for (const name of loaded) {
        const chunk = chunks.get(name);
        if (!chunk) continue;
        bytes += gzipSync(chunk.code).length;
        const early = without.filter((name) => chunk.moduleIds.some((id) => id.includes(`node_modules/${name}/`)));
        if (early.length > 0)
          this.error(`first load of /${route} contains ${early.join(', ')}, which must be loaded later`);
      }
      const used = (bytes / 1024).toFixed(1);
      if (bytes > kilobytes * 1024)
        this.error(`first load of /${route} is ${used} KB gzip, above the budget of ${kilobytes} KB`);
      this.info(`first load of /${route}: ${used} KB gzip of ${kilobytes} KB`);
    }
  };
}
