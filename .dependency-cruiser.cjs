const { readdirSync } = require('node:fs');
const path = require('node:path');

const escaped = (text) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/** Every `_folder` below app/, except those of app/ itself, which all routes share. */
function privateFolders(folder = 'app') {
  return readdirSync(path.join(__dirname, folder), { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .flatMap(({ name }) => {
      const inside = `${folder}/${name}`;
      const own = name.startsWith('_') && folder !== 'app' ? [{ route: folder, folder: inside }] : [];
      return [...own, ...privateFolders(inside)];
    });
}

const pure = ['units', 'sky', 'array', 'clock', 'schedule', 'outlook', 'exchange'];
const layers = (...names) => `^src/(${names.join('|')})/`;

/** A layer that imports only what is listed: of the project and of everything outside it alike. */
const only = (layer, mayImport, why, packages = []) => ({
  name: `${layer}-imports`,
  comment: why,
  severity: 'error',
  from: { path: `^src/${layer}/` },
  to: { pathNot: [layers(layer, ...mayImport), ...packages.map((p) => `^node_modules/${p}/`)] },
});

const entry = [
  '/(page|layout|template|route|error|global-error|not-found|forbidden|default|loading)\\.tsx?$',
  '/[a-z-]*actions?\\.ts$',
];

// below app/api everything runs on the server: what its routes share is no component
const noComponent = [...entry, '^app/api/'];

module.exports = {
  forbidden: [
    only('units', [], 'units imports nothing'),
    only('sky', ['units'], 'sky imports units, and astronomy-engine by its one door', ['astronomy-engine']),
    only('clock', ['units'], 'clock imports units'),
    only('array', ['units', 'sky'], 'array imports units and sky, and the Fourier transform', ['fft\\.js']),
    only('schedule', ['units', 'sky', 'array'], 'schedule imports units, sky and array'),
    only('outlook', ['units', 'sky', 'array', 'clock', 'schedule'], 'outlook joins the pure layers'),
    only('access', pure, 'access imports the types of the domain and does no input or output'),
    {
      name: 'exchange-imports',
      comment: 'exchange imports the pure layers and a format library: text in, values out',
      severity: 'error',
      from: { path: layers('exchange') },
      to: {
        path: [
          '^(app|db|e2e|tests|src)/',
          '^node_modules/(@types/)?(react|react-dom|next|drizzle-orm|zod|@libsql)/',
        ],
        pathNot: layers(...pure),
      },
    },
    {
      name: 'engine-door',
      comment: 'src/sky/engine.ts is the only importer of astronomy-engine; benchmarks measure against it',
      severity: 'error',
      from: { path: '^(app|src|db|scripts)/', pathNot: '^(src/sky/engine\\.ts$|scripts/bench/peers/)' },
      to: { path: 'astronomy-engine' },
    },
    {
      name: 'server-below-app',
      comment: 'data, viewer, mail and db know nothing of the app and its components',
      severity: 'error',
      from: { path: ['^src/(data|viewer|mail)/', '^src/[^/]+\\.ts$', '^db/'] },
      to: { path: ['^app/', '^(e2e|tests)/', '^node_modules/(react-dom|sonner|@dnd-kit)/'] },
    },
    {
      name: 'source-below-tests',
      comment: 'nothing that ships imports a test',
      severity: 'error',
      from: { path: '^(app|src|db|scripts)/' },
      to: { path: '^(e2e|tests)/' },
    },
    {
      name: 'login-door',
      comment: 'Lucia lives in src/viewer and nowhere else',
      severity: 'error',
      from: { pathNot: '^(src/viewer|node_modules)/' },
      to: { path: '^(node_modules/)?(lucia|@lucia-auth)(/|$)' },
    },
    {
      name: 'components-no-server-values',
      comment: 'a component gets plain props; of data it imports types only, of viewer, mail and db nothing',
      severity: 'error',
      from: { path: '^app/', pathNot: noComponent },
      to: {
        path: [
          '^src/(data|viewer|mail)/',
          '^src/(env|log)\\.ts$',
          '^db/',
          '^node_modules/(drizzle-orm|@libsql)/',
        ],
        dependencyTypesNot: ['type-only'],
      },
    },
    {
      name: 'components-no-server-types',
      comment: 'types of rows stay behind the data layer: a component sees the DTOs of src/data',
      severity: 'error',
      from: { path: '^app/', pathNot: noComponent },
      to: { path: ['^src/(viewer|mail)/', '^db/', '^node_modules/(drizzle-orm|@libsql)/'] },
    },
    ...privateFolders().map(({ route, folder }) => ({
      name: `private-${folder}`,
      comment: `${folder} belongs to the routes below ${route}`,
      severity: 'error',
      from: { path: '^app/', pathNot: `^${escaped(route)}/` },
      to: { path: `^${escaped(folder)}/` },
    })),
    {
      name: 'no-circular',
      comment: 'modules that need each other are one module, or hide a third',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'resolvable',
      comment: 'an import that leads nowhere',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^\\.next/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
