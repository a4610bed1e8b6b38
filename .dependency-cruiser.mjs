/**
 * The layer gate. `shared/` layers, lowest first, each with the layers it may import besides itself;
 * the reasons are in DEVELOPERS.md.
 */
const MAY_IMPORT = {
  units: [],
  physics: ['units'],
  stage: ['units', 'physics'],
  checks: ['units', 'physics', 'stage'],
  sizing: ['units', 'physics', 'stage', 'checks'],
  statistics: ['units', 'physics', 'stage', 'checks'],
  parts: ['units', 'physics', 'stage'],
  traces: ['units', 'physics'],
  method: [],
  review: [],
  report: ['units', 'physics', 'stage', 'checks', 'sizing', 'statistics', 'parts', 'method'],
  contract: [
    'units',
    'physics',
    'stage',
    'checks',
    'sizing',
    'statistics',
    'parts',
    'traces',
    'method',
    'review',
    'report',
  ],
};

const layers = Object.entries(MAY_IMPORT).map(([layer, lower]) => ({
  name: `shared-${layer}-imports-only-lower-layers`,
  severity: 'error',
  from: { path: `^shared/${layer}/` },
  to: { path: '^shared/', pathNot: `^shared/(${[layer, ...lower].join('|')})/` },
}));

export default {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'plain-core',
      severity: 'error',
      from: { path: '^shared/(units|physics|review)/' },
      to: { path: '^node_modules/' },
    },
    {
      name: 'shared-is-a-leaf',
      severity: 'error',
      from: { path: '^shared/' },
      to: { path: '^(src|server|node_modules/(?!zod/))' },
    },
    {
      name: 'client-and-server-meet-in-shared',
      severity: 'error',
      from: { path: '^(src|server)/' },
      to: { path: '^(src|server)/', pathNot: '^$1/' },
    },
    {
      name: 'features-do-not-import-features',
      severity: 'error',
      from: { path: '^src/app/([^/]+)/' },
      to: { path: '^src/app/([^/]+)/', pathNot: '^src/app/($1|ui|api|session|schematic|charts)/' },
    },
    ...layers,
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|data|\\.angular)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.app.json' },
  },
};
