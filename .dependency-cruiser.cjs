const only = (name, from, allowed, why) => ({
  name,
  severity: 'error',
  comment: why,
  from: { path: `^src/lib/${from}` },
  to: { path: '^src/', pathNot: `^src/lib/(${allowed})` }
});

const sole = (pkg, folder) => ({
  name: `sole-importer-of-${pkg}`,
  severity: 'error',
  comment: `Only ${folder} may import ${pkg}, so that its load, its faults and its upgrades have one place.`,
  from: { path: '^src/', pathNot: `^src/${folder}` },
  to: { path: `node_modules/${pkg}/` }
});

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      comment: 'Two modules that need each other are one module.',
      from: {},
      to: { circular: true }
    },
    only(
      'numerics-stands-alone',
      'core/numerics/',
      'core/(numerics/|result)',
      'numerics is the floor: it knows nothing of designs or campaigns.'
    ),
    only(
      'design-on-numerics',
      'core/design/',
      'core/(design/|numerics/|result)',
      'design and analysis do not know each other.'
    ),
    only(
      'analysis-on-numerics',
      'core/analysis/',
      'core/(analysis/|numerics/|result)',
      'design and analysis do not know each other.'
    ),
    only(
      'campaign-stands-alone',
      'core/campaign/',
      'core/(campaign/|result)',
      'The record needs no statistics; hand numbers in.'
    ),
    only(
      'exchange-on-campaign',
      'core/exchange/(?!package/)',
      'core/(exchange/|campaign/|result)',
      'Files carry the record and nothing else.'
    ),
    only(
      'package-on-campaign-and-results',
      'core/exchange/package/',
      'core/(exchange/|campaign/|analysis/|result)',
      'A data package carries the record and the results, and computes neither.'
    ),
    {
      name: 'package-names-results-only',
      severity: 'error',
      comment: 'A data package may name the types of an analysis; it runs none.',
      from: { path: '^src/lib/core/exchange/package/' },
      to: { path: '^src/lib/core/analysis/', dependencyTypesNot: ['type-only'] }
    },
    only('formula-on-core', 'formula/', 'formula/|core/', 'formula is an adapter around core.'),
    only('storage-on-core', 'storage/', 'storage/|core/', 'storage is an adapter around core.'),
    only(
      'workers-on-core',
      'workers/',
      'workers/|core/|formula/|storage/',
      'A worker is a thin adapter around a core function; it may write what it computed through storage.'
    ),
    only(
      'state-below-screens',
      'state/',
      'state/|core/|formula/|storage/|workers/|pwa/|ui/texts/',
      'State serves screens and does not know them.'
    ),
    only('pwa-stands-alone', 'pwa/', 'pwa/|core/', 'pwa talks to the browser only.'),
    {
      name: 'ui-knows-core-types-only',
      severity: 'error',
      comment: 'Components take props and call callbacks: no storage, no worker, no statistics.',
      from: { path: '^src/lib/ui/' },
      to: { path: '^src/', pathNot: '^src/lib/(ui|core)/' }
    },
    {
      name: 'ui-core-values',
      severity: 'error',
      comment: 'ui may name core types; what it shows is computed elsewhere and handed in.',
      from: { path: '^src/lib/ui/' },
      to: { path: '^src/lib/core/', dependencyTypesNot: ['type-only'], pathNot: '^src/lib/core/result' }
    },
    {
      name: 'lib-below-routes',
      severity: 'error',
      comment: 'No import upward.',
      from: { path: '^src/lib/' },
      to: { path: '^src/(routes|cli|service-worker)/' }
    },
    sole('mathjs', 'lib/formula/'),
    sole('idb', 'lib/storage/'),
    sole('workbox-window', 'lib/pwa/')
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'browser', 'default', 'types', 'svelte'],
      extensions: ['.ts', '.js', '.mjs', '.svelte', '.json']
    }
  }
};
