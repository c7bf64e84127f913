// Checks the architecture of Benchleaf. Reordering a list reorders the architecture.
// An item may import only what stands to its left; a server feature does so through a door (index.ts).
const sharedModules = [
  'kit',
  'access',
  'units',
  'expressions',
  'calc',
  'plan',
  'crystal',
  'relations',
  'document',
  'reading',
  'search',
  'api',
];
const serverLayers = ['config', 'db', 'storage', 'jobs', 'http', 'features'];
const serverFeatures = [
  'accounts',
  'manuals',
  'pages',
  'recognition',
  'revisions',
  'coediting',
  'comments',
  'values',
  'editions',
  'search',
];
const sourceLayers = ['lib', 'ui', 'api', 'blocks', 'scan', 'features', 'app'];

const forbid = (name, from, to) => ({ name, severity: 'error', from, to });

const looksLeftOnly = (list, root) =>
  list
    .slice(0, -1)
    .map((item, at) =>
      forbid(
        `${root}/${item} looks left only`,
        { path: `^${root}/${item}[/.]` },
        { path: `^${root}/(${list.slice(at + 1).join('|')})[/.]` },
      ),
    );

const composers = 'pipeline|app|start|main|worker';

module.exports = {
  forbidden: [
    forbid('shared stands alone', { path: '^shared/' }, { path: '^(src|server)/' }),
    forbid('client never reads server', { path: '^src/' }, { path: '^server/' }),
    forbid('server never reads client', { path: '^server/' }, { path: '^src/' }),
    forbid('nothing reads tests', { path: '^(src|server|shared)/' }, { path: '^tests/' }),
    forbid(
      'composers are read by nobody',
      { path: '^server/[^/]+/', pathNot: '^server/(demo|scripts)/' },
      { path: `^server/((${composers})\\.ts$|demo/|scripts/)` },
    ),
    forbid(
      'client features are strangers',
      { path: '^src/features/([^/]+)/' },
      { path: '^src/features/', pathNot: '^src/features/$1/' },
    ),
    forbid(
      'server features meet at the door',
      { path: '^server/features/([^/]+)/' },
      { path: '^server/features/[^/]+/', pathNot: ['^server/features/$1/', '/index\\.ts$'] },
    ),
    forbid(
      'shared uses few packages',
      { path: '^shared/', pathNot: ['\\.test\\.ts$', '^shared/document/(page-schema|shared-text)\\.ts$'] },
      {
        dependencyTypes: ['npm', 'npm-dev', 'core'],
        pathNot: 'node_modules/(zod|decimal\\.js|mathjs)/',
      },
    ),
    forbid(
      'shared text stays in document',
      { path: '^shared/', pathNot: '^shared/document/(page-schema|shared-text)\\.ts$' },
      { path: 'node_modules/(yjs|@tiptap)/' },
    ),
    forbid(
      'mathjs stays in units and expressions',
      { path: '^(shared|src|server)/', pathNot: ['^shared/(units|expressions)/', '\\.test\\.ts$'] },
      { path: 'node_modules/mathjs/' },
    ),
    ...looksLeftOnly(sharedModules, 'shared'),
    ...looksLeftOnly(serverLayers, 'server'),
    ...looksLeftOnly(serverFeatures, 'server/features'),
    ...looksLeftOnly(sourceLayers, 'src'),
    forbid('no rings', {}, { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } }),
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'server/tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '\\.tsc/|dist/' },
    enhancedResolveOptions: { extensions: ['.ts', '.tsx', '.js'], conditionNames: ['import', 'node', 'default'] },
  },
};
