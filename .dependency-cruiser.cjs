/**
 * Who may import whom: the table of DEVELOPERS.md. Each rule forbids what its row does not allow.
 *
 * The parser is swc, since dependency-cruiser reads no TypeScript by itself under TypeScript 7 and would pass empty.
 * It asks swc for TypeScript without JSX and does not tell types from values; both are set right here, in the module
 * that it shares with this file.
 */
const swc = require('@swc/core');

const parseFileSync = swc.parseFileSync;
swc.parseFileSync = (file, options) => {
  const program = parseFileSync(file, { ...options, tsx: file.endsWith('.tsx') });
  // Types cost nothing at run time, so a component may know those of any folder.
  if (/(^|\/)components\//.test(file)) program.body = program.body.filter((item) => !isTypeImport(item));
  return program;
};

const isTypeImport = (item) => item.type === 'ImportDeclaration' && item.typeOnly;

/** @returns {import('dependency-cruiser').IForbiddenRuleType} */
const only = (name, from, allowed, comment) => ({
  name,
  comment,
  severity: 'error',
  from,
  to: { path: '^(app|components|db|lib|schemas|storage|tests)/', pathNot: allowed },
});

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    only('app', { path: '^app/' }, '^(app|components|lib|schemas)/', 'routes: components, lib, schemas'),
    only(
      'components',
      { path: '^components/' },
      '^(components|schemas)/|^lib/(engine|documents)/|^lib/auth/permissions|^lib/deposits/states',
      'components render what they are given; from elsewhere types only',
    ),
    only(
      'lib',
      { path: '^lib/', pathNot: '^lib/engine/' },
      '^(lib|schemas|db|storage)/',
      'lib: lib, schemas, db, storage',
    ),
    only('engine', { path: '^lib/engine/' }, '^lib/engine/', 'the engine stands alone'),
    {
      name: 'engine-packages',
      comment: 'named numerical packages only; no part of Node',
      severity: 'error',
      from: { path: '^lib/engine/' },
      to: { path: '.', pathNot: '^lib/engine/|^node_modules/@stdlib/' },
    },
    only(
      'db',
      { path: '^db/', pathNot: '^db/seed/' },
      '^(db|schemas)/|^lib/env',
      'db: Drizzle, schemas, settings',
    ),
    only(
      'seed',
      { path: '^db/seed/' },
      '^(db|lib|schemas)/',
      'the demonstration scenario writes through what the application writes with: db, lib, schemas',
    ),
    only('storage', { path: '^storage/' }, '^storage/|^lib/env', 'storage: its SDK, settings'),
    only(
      'schemas',
      { path: '^schemas/' },
      '^schemas/|^lib/engine/units',
      'schemas: Zod, units of the engine',
    ),
    {
      name: 'drizzle-in-db-only',
      comment: 'SQL is written in db/ and nowhere else',
      severity: 'error',
      from: { pathNot: '^(db|tests)/|^drizzle\\.config' },
      to: { path: '^node_modules/(drizzle-orm|@libsql|libsql)/' },
    },
    {
      name: 'no-tests-in-the-product',
      severity: 'error',
      from: { pathNot: '^tests/' },
      to: { path: '^tests/' },
    },
    { name: 'no-circle', severity: 'error', from: {}, to: { circular: true } },
    { name: 'resolves', severity: 'error', from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    parser: 'swc',
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: '^node_modules' },
    exclude: { path: '^(\\.next|\\.build|data)/' },
    enhancedResolveOptions: {
      extensions: ['.ts', '.tsx', '.js', '.mjs', '.cjs', '.json', '.css'],
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
