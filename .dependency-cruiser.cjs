/**
 * Who may import whom. The baseline is zero; each rule has a canary under server/scripts/architecture/fixtures that must
 * trip it, so that a rule that no longer matches anything is noticed.
 */
const APP = '^projects/wakeledger/src/app/';
const TESTS = '\\.(spec|test)\\.ts$|/testing/';
const npm = (names) => `(^|/)node_modules/(${names})(/|$)`;

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    {
      name: 'core-imports-nothing',
      severity: 'error',
      comment: 'The method can be read and run without anything else: pass it in as an argument.',
      from: { path: '^shared/core/', pathNot: TESTS },
      to: { pathNot: '^shared/core/' },
    },
    {
      name: 'access-imports-core-only',
      severity: 'error',
      comment: 'Roles and permissions are read by both sides; they know neither.',
      from: { path: '^shared/access/', pathNot: TESTS },
      to: { pathNot: '^shared/(core|access)/' },
    },
    {
      name: 'contracts-import-core-access-zod',
      severity: 'error',
      comment: 'A contract is where the halves meet: core, access and zod, nothing of either half.',
      from: { path: '^shared/contracts/', pathNot: TESTS },
      to: { pathNot: ['^shared/(core|access|contracts)/', npm('zod')] },
    },
    {
      name: 'client-not-to-server',
      severity: 'error',
      comment: 'The client meets the server in shared/contracts only.',
      from: { path: '^projects/' },
      to: { path: '^(server|seeds|migrations)/' },
    },
    {
      name: 'server-not-to-client',
      severity: 'error',
      comment: 'The server meets the client in shared/contracts only.',
      from: { path: '^(server|seeds)/' },
      to: { path: '^projects/' },
    },
    {
      name: 'e2e-from-outside',
      severity: 'error',
      comment: 'Journeys use the product as a person does: browser and HTTP, seeds at most.',
      from: { path: '^e2e/' },
      to: { path: '^(server|projects)/' },
    },
    {
      name: 'module-by-its-front-door',
      severity: 'error',
      comment: 'Another module is entered by its index.ts; what it does not export is its own business.',
      from: { path: '^server/modules/([^/]+)/', pathNot: TESTS },
      to: {
        path: '^server/modules/[^/]+/',
        pathNot: ['^server/modules/$1/', '^server/modules/[^/]+/index\\.ts$'],
      },
    },
    {
      name: 'module-by-its-front-door-from-outside',
      severity: 'error',
      comment: 'The rest of the server knows a module by its index.ts too.',
      from: { path: '^(server/(?!modules/[^/]+/)|seeds/)', pathNot: TESTS },
      to: { path: '^server/modules/[^/]+/', pathNot: '^server/modules/[^/]+/index\\.ts$' },
    },
    {
      name: 'routes-through-service',
      severity: 'error',
      comment: 'Routes ask the service; only the service asks the repository.',
      from: { path: '^server/modules/.+\\.routes\\.ts$' },
      to: { path: '\\.repository\\.ts$' },
    },
    {
      name: 'repository-at-the-bottom',
      severity: 'error',
      comment: 'A repository reads and writes rows; it calls neither services nor routes.',
      from: { path: '^server/modules/.+\\.repository\\.ts$' },
      to: { path: '\\.(service|routes)\\.ts$' },
    },
    {
      name: 'tables-in-repositories-only',
      severity: 'error',
      comment:
        'In a module only its repositories know tables, so that what a query may see is decided in one place.',
      from: { path: '^server/modules/', pathNot: ['\\.repository\\.ts$', TESTS] },
      to: { path: '^server/db/tables/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'database-client-in-db-only',
      severity: 'error',
      comment:
        'Connections and transactions come from server/db: in-tenant.ts sets the organisation in every one.',
      from: { path: '^(server|seeds)/', pathNot: ['^server/(db|scripts|testing)/', TESTS] },
      to: { path: [npm('pg'), npm('drizzle-orm/node-postgres')], dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'ui-presents-only',
      severity: 'error',
      comment:
        'A part of ui takes inputs and gives outputs; it knows no store, router, HTTP, data or feature.',
      from: { path: `${APP}ui/`, pathNot: TESTS },
      to: {
        path: [
          npm('@ngrx/[^/]+'),
          npm('@angular/router'),
          '(^|/)node_modules/@angular/common/.*http',
          `${APP}(data|features)/`,
          `${APP}core/(session|shell|navigation)/`,
          `${APP}core/api/api-client\\.ts$`,
        ],
      },
    },
    {
      name: 'http-in-api-files-only',
      severity: 'error',
      comment: 'Requests leave through a *-api.ts file, so that every one of them is found by its name.',
      from: { path: APP, pathNot: ['-api\\.ts$', `${APP}core/api/`, `${APP}app\\.config\\.ts$`, TESTS] },
      to: { path: '(^|/)node_modules/@angular/common/.*http' },
    },
    {
      name: 'calls-in-api-files-only',
      severity: 'error',
      comment: 'The typed client is used by *-api.ts files and by the session, by nobody else.',
      from: { path: APP, pathNot: ['-api\\.ts$', `${APP}core/(api|session)/`, TESTS] },
      to: { path: `${APP}core/api/api-client\\.ts$` },
    },
    {
      name: 'slices-in-data-only',
      severity: 'error',
      comment: 'Reducers and effects live in data/, by domain.',
      from: { path: APP, pathNot: [`${APP}data/`, `${APP}app\\.config\\.ts$`, TESTS] },
      to: { path: npm('@ngrx/(effects|entity|operators)') },
    },
    {
      name: 'data-knows-no-feature',
      severity: 'error',
      comment: 'A slice outlives the pages that read it.',
      from: { path: `${APP}data/`, pathNot: TESTS },
      to: { path: `${APP}features/` },
    },
    {
      name: 'feature-not-to-feature',
      severity: 'error',
      comment: 'A feature can be deleted by deleting its folder: share through data, ui or core.',
      from: { path: `${APP}features/([^/]+)/` },
      to: { path: `${APP}features/[^/]+/`, pathNot: `${APP}features/$1/` },
    },
    {
      name: 'core-is-feature-blind',
      severity: 'error',
      comment: 'What is app-wide knows no domain.',
      from: { path: `${APP}core/`, pathNot: TESTS },
      to: { path: `${APP}(data|features)/` },
    },
    {
      name: 'no-cycles',
      severity: 'error',
      comment:
        'Two files that need each other are one file, or miss a third. A type alone makes no cycle when it runs.',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'nothing-unresolvable',
      severity: 'error',
      comment: 'The import leads nowhere.',
      from: {},
      to: { couldNotResolve: true },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)fixtures/' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.mts', '.js', '.mjs', '.cjs', '.json', '.d.ts'],
    },
  },
};
