/** Import directions of the house: each rule a row of the table in DEVELOPERS.md. */
const from = (name, path, allowed, comment) => ({
  name,
  comment,
  severity: 'error',
  from: { path },
  to: { path: OWN, pathNot: allowed },
});

/** Anything of ours; packages are judged by the package rules below. */
const OWN = '^(app|components|entities|lib|migrations|seeders|scripts|tests|mikro-orm)';

const only = (name, path, packages) => ({
  name,
  severity: 'error',
  from: { path },
  to: {
    dependencyTypes: ['npm', 'npm-dev', 'npm-peer', 'npm-optional', 'npm-no-pkg', 'core'],
    pathNot: packages,
  },
});

const pkg = (names) => `^(node_modules/(@types/)?(${names})/|(${names})$)`;

/** @type {import('dependency-cruiser').IConfiguration} */
const config = {
  forbidden: [
    from('domain-imports-itself', '^lib/domain', ['^lib/domain'], 'Arithmetic knows nothing else.'),
    only('domain-packages', '^lib/domain', pkg('fft\\.js|papaparse|ml-matrix')),
    from('schemas', '^lib/(schemas|routes|format)', ['^lib/(domain|schemas|routes|format)']),
    only('schemas-packages', '^lib/(schemas|routes|format)', pkg('zod')),
    from('entities', '^entities', ['^entities', '^lib/domain']),
    only('entities-packages', '^entities', pkg('@mikro-orm/.*')),
    {
      name: 'server-knows-no-screens',
      severity: 'error',
      from: { path: '^lib/server' },
      to: { path: '^(app|components|lib/client|seeders|scripts|tests)' },
    },
    from('client', '^lib/client', ['^lib/(domain|schemas|routes|format|client)']),
    from('components', '^components', [
      '^lib/(domain|schemas|routes|format|client)',
      '^components',
    ]),
    {
      name: 'app-knows-no-tables',
      severity: 'error',
      from: { path: '^app' },
      to: { path: '^(entities|seeders|mikro-orm|migrations|node_modules/@mikro-orm)' },
    },
    {
      name: 'no-import-between-routes',
      comment: 'What two routes share belongs in components or lib.',
      severity: 'error',
      from: { path: '^app/\\(register\\)/([^/]+)/' },
      to: { path: '^app/\\(register\\)/[^/]+/', pathNot: '^app/\\(register\\)/$1/' },
    },
    {
      name: 'migrations-are-sql',
      severity: 'error',
      from: { path: '^migrations' },
      to: { pathNot: pkg('@mikro-orm/migrations') },
    },
    {
      name: 'no-cycles',
      severity: 'error',
      from: { pathNot: '^entities' },
      to: { circular: true },
    },
    {
      name: 'product-imports-no-tests',
      severity: 'error',
      from: { path: '^(app|components|entities|lib|seeders)' },
      to: { path: '^tests' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)\\.next' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

export default config;
