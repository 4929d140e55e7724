// Who may import whom. A rule without type-only holds for types as well.
const npmOnly = (...names) => `^node_modules/(@types/)?(${names.join('|')})/`;
const runtime = { dependencyTypesNot: ['type-only'] };

/** Code in `from` may reach nothing but `allowed` (and itself). */
const only = (name, comment, from, ...allowed) => ({
  name,
  comment,
  severity: 'error',
  from: { path: from },
  to: { pathNot: [from, ...allowed] },
});

const never = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });

const packages = '^node_modules/';
// node: modules have no folder: fs, path, node:zlib, stream/promises.
const nodeItself = '^(node:)?[a-z_]+$|^(node:)?[a-z_]+/(promises|web)$';
const domain = '^lib/domain/';
const numerics = '^lib/numerics/';
const figures = '^lib/figures/';
const jobs = '^lib/jobs/';
const readers = '^lib/readers/';
const errors = '^lib/errors\\.ts$';
const env = '^lib/env\\.ts$';
const zod = npmOnly('zod');
const components = '^app/.*_components/';
const opensDatabase = ['^app/_server/context\\.ts$', '^worker/context\\.ts$', '^worker/commands/', '^db/', '^tests/support/'];

module.exports = {
  forbidden: [
    never('no-cycles', 'Files that need each other are one file, or need a third.', {}, { circular: true }),
    never('resolvable', 'An import must lead somewhere.', {}, { couldNotResolve: true }),
    never('declared-packages', 'A package that is used stands in package.json.', {}, {
      dependencyTypes: ['npm-no-pkg', 'npm-unknown'],
    }),
    never('no-development-packages', 'The product runs without the development packages.',
      { path: '^(app|lib|db|worker)/', pathNot: '^app/fonts/build-' },
      { dependencyTypes: ['npm-dev'], ...runtime }),
    never('no-index-files', 'Name the file that holds what you want.', {}, {
      path: '(^|/)index\\.(ts|tsx|mjs)$', pathNot: '^node_modules/',
    }),

    never('app-apart-from-worker', 'They meet in lib.', { path: '^app/' }, { path: '^worker/' }),
    never('worker-apart-from-app', 'They meet in lib.', { path: '^worker/' }, { path: '^app/' }),
    never('lib-not-upward', 'app → lib → db, worker → lib → db.', { path: '^lib/' }, {
      path: '^(app|worker|fixtures|docker)/',
    }),
    never('app-through-services', 'Pages and routes reach data through services.',
      { path: '^app/', pathNot: '^app/_server/context\\.ts$' }, { path: '^db/' }),
    never('worker-through-services', 'Handlers reach data through services.',
      { path: '^worker/', pathNot: '^worker/(context\\.ts$|commands/)' }, { path: '^db/' }),
    never('who-opens-the-database', 'A pool belongs to a context.',
      { pathNot: opensDatabase }, { path: ['^db/client\\.ts$', npmOnly('pg')], ...runtime }),
    never('only-tests-import-tests', 'What tests share is theirs.', { pathNot: '^tests/' }, { path: '^tests/' }),
    never('demo-is-a-client', 'The demo uses the HTTP API like anybody.', { path: '^fixtures/demo/' }, {
      path: '^(app|worker|db)/|^lib/(services|platform)/',
    }),

    only('numerics', 'Runs as it is in the browser, the worker and the tests.', numerics, npmOnly('mathjs')),
    only('domain', 'Rules that page and server share.', domain, numerics, errors, zod),
    only('figures', 'Geometry without a canvas.', figures, numerics),
    only('jobs', 'Contracts alone.', jobs, domain, zod),
    only('platform', 'Thin adapters.', '^lib/platform/', jobs, env, errors, packages, nodeItself),
    only('readers', 'Files into columns.', readers, numerics, domain, errors, packages, nodeItself),
    only('documents', 'What is read, as a file.', '^lib/documents/',
      readers, numerics, domain, figures, errors, packages, nodeItself),
    only('errors', 'One table that everybody may import.', errors, zod),
    only('env', 'The environment, read once.', env, zod),
    only('db', 'Queries; the URL is handed in.', '^(db|migrations)/', npmOnly('kysely', 'pg'), nodeItself),

    never('components-stay-in-front', 'Components get props; they know the domain, not the server.',
      { path: components }, { path: '^(db|worker)/|^lib/(env\\.ts|platform/|jobs/|readers/|documents/)|^app/_server/' }),
    never('components-know-services-by-type', 'A service would drag the server into the browser.',
      { path: components }, { path: '^lib/services/', ...runtime }),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    exclude: { path: '^((\\.next|\\.fourfold)|lib/readers/table-rows)/' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      mainFields: ['module', 'main', 'types', 'typings'],
    },
  },
};
