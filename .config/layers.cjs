/**
 * The layer table: who may import whom. Unlisted means forbidden; type-only imports count.
 * Each layer may also import itself and, unless it is one of them, the layers of `everyone`.
 * `at` names the folders and files of a layer; `runs` says which world it may ask for: pure layers get neither Node nor DOM.
 * `sisters` names a folder whose subfolders never import each other, save one called shared.
 * To change this table is a commit of its own that says why.
 */
module.exports = {
  everyone: ['problems', 'wind'],

  layers: [
    { name: 'problems', at: ['src/problems'], runs: 'anywhere', layers: [], packages: [] },
    { name: 'wind', at: ['src/wind'], runs: 'anywhere', layers: [], packages: [] },
    { name: 'bytes', at: ['src/bytes'], runs: 'anywhere', layers: [], packages: [] },
    { name: 'contract', at: ['src/contract'], runs: 'anywhere', layers: [], packages: ['zod'] },
    {
      name: 'geometry',
      at: ['src/geometry'],
      runs: 'anywhere',
      layers: [],
      packages: ['@turf/turf', 'geographiclib-geodesic'],
    },
    { name: 'swath', at: ['src/swath'], runs: 'anywhere', layers: ['geometry'], packages: [] },
    {
      name: 'decode',
      at: ['src/decode'],
      sisters: 'src/decode/products',
      runs: 'anywhere',
      layers: ['bytes', 'swath'],
      packages: [],
    },
    { name: 'exchange', at: ['src/exchange'], runs: 'anywhere', layers: ['bytes', 'geometry'], packages: [] },
    {
      name: 'analyse',
      at: ['src/analyse'],
      sisters: 'src/analyse',
      runs: 'anywhere',
      layers: ['swath', 'geometry'],
      packages: [],
    },
    {
      name: 'brief',
      at: ['src/brief'],
      runs: 'anywhere',
      layers: ['analyse', 'exchange', 'swath', 'geometry'],
      packages: [],
    },
    { name: 'files', at: ['src/files'], runs: 'node', layers: ['bytes'], packages: [] },
    { name: 'demo', at: ['src/demo'], runs: 'node', layers: ['decode', 'analyse', 'swath', 'geometry'], packages: [] },
    {
      name: 'store',
      at: ['src/store'],
      runs: 'node',
      layers: ['swath', 'geometry', 'contract'],
      packages: ['better-sqlite3'],
    },
    {
      name: 'workers',
      at: ['src/workers'],
      runs: 'node',
      layers: ['files', 'bytes', 'decode', 'swath', 'analyse', 'store', 'contract'],
      packages: [],
    },
    {
      name: 'operations',
      at: ['src/operations'],
      runs: 'node',
      layers: ['contract', 'files', 'store', 'workers', 'analyse', 'exchange', 'brief', 'swath', 'geometry'],
      packages: [],
    },
    { name: 'door', at: ['src/door'], runs: 'node', layers: ['contract', 'operations'], packages: [] },

    {
      name: 'hosts/node24',
      at: ['src/hosts/node24.mjs'],
      runs: 'node',
      layers: [],
      packages: [],
      // It runs a file that the entry beside it names.
      importsComputed: true,
    },
    {
      name: 'hosts/shared',
      at: ['src/hosts/shared'],
      runs: 'node',
      layers: ['operations'],
      packages: [],
    },
    {
      name: 'hosts/electron',
      at: ['src/hosts/electron'],
      runs: 'node',
      layers: ['contract', 'operations', 'door', 'hosts/shared'],
      packages: ['electron'],
    },
    {
      name: 'hosts/loopback',
      at: ['src/hosts/loopback'],
      runs: 'node',
      layers: ['contract', 'operations', 'door', 'hosts/shared'],
      packages: [],
    },
    {
      name: 'hosts/command',
      at: ['src/hosts/command'],
      runs: 'node',
      layers: ['contract', 'operations', 'door', 'hosts/shared', 'hosts/node24'],
      packages: [],
    },
    {
      name: 'hosts/launch',
      at: ['src/hosts/launch.mjs', 'src/hosts/launch'],
      runs: 'node',
      layers: ['hosts/node24', 'hosts/loopback'],
      packages: [],
    },

    // zod: what a host answers is checked by the contract's own checks before anyone sees it.
    { name: 'renderer/backend', at: ['renderer/backend'], runs: 'browser', layers: ['contract'], packages: ['zod'] },
    {
      name: 'renderer/state',
      at: ['renderer/state'],
      runs: 'browser',
      layers: ['contract', 'renderer/backend'],
      packages: [],
    },
    {
      name: 'renderer/map',
      at: ['renderer/map'],
      runs: 'browser',
      layers: ['renderer/state'],
      packages: ['maplibre-gl'],
    },
    {
      name: 'renderer/layers',
      at: ['renderer/layers'],
      sisters: 'renderer/layers',
      runs: 'browser',
      layers: ['contract', 'geometry', 'renderer/map', 'renderer/state'],
      packages: ['maplibre-gl'],
    },
    {
      name: 'renderer/panels',
      at: ['renderer/panels'],
      sisters: 'renderer/panels',
      runs: 'browser',
      layers: ['contract', 'renderer/backend', 'renderer/state'],
      packages: [],
    },
    {
      name: 'renderer/report',
      at: ['renderer/report'],
      runs: 'browser',
      layers: ['contract', 'renderer/backend', 'renderer/state', 'renderer/map'],
      packages: [],
    },
    {
      name: 'renderer/main',
      at: ['renderer/main.ts', 'renderer/main', 'renderer/index.html', 'renderer/main.css'],
      runs: 'browser',
      layers: [
        'contract',
        'renderer/backend',
        'renderer/state',
        'renderer/map',
        'renderer/layers',
        'renderer/panels',
        'renderer/report',
      ],
      packages: ['maplibre-gl', '@fontsource/atkinson-hyperlegible-next', '@fontsource/atkinson-hyperlegible-mono'],
    },
  ],

  /** Names that say nothing of what a file gives. */
  vagueNames: ['common', 'helper', 'helpers', 'index', 'lib', 'misc', 'stuff', 'things', 'tools', 'util', 'utils'],
  /** A page must be called index.html: it is what a browser asks for. */
  allowedVagueFiles: ['renderer/index.html'],

  /** All that may stand at the top of the tree, beside dot files. */
  topLevel: [
    'package.json',
    'package-lock.json',
    'electron.config.ts',
    'README.md',
    'DEVELOPERS.md',
    'LICENSE',
    'src',
    'renderer',
    'assets',
    'tests',
  ],
  /** What tools make and nobody commits. */
  made: ['node_modules', 'dist', 'test-results', 'playwright-report'],
};
