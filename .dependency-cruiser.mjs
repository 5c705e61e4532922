/**
 * Imports run one way (law 1): web and api -> common; features -> platform -> nothing above; a slice reaches another
 * slice only through that slice's public file. No cycles.
 */
/** What never ships: tests, harnesses and the builders both use. */
const anySpec = '([.]spec|[.-]harness)[.]ts$|/testing/';

/** @type {import('dependency-cruiser').IConfiguration} */
export default {
  forbidden: [
    {
      name: 'no-cycle',
      comment: 'Two files that need each other are one idea, or an idea is missing between them.',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'found',
      comment: 'An import that cannot be resolved hides every arrow behind it.',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'common-stands-alone',
      comment: 'Rules and contracts run in the browser and on the server, so they know neither.',
      severity: 'error',
      from: { path: '^packages/common/src/' },
      to: { path: '^(packages/(api|web)|infra)/' },
    },
    {
      name: 'common-is-pure',
      comment: 'No input or output in common: no module of Node.',
      severity: 'error',
      from: { path: '^packages/common/src/', pathNot: anySpec },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'common-slices-stand-apart-from-tests',
      comment: 'Builders are for tests: no rule may rest on one.',
      severity: 'error',
      from: { path: '^packages/common/src/', pathNot: anySpec },
      to: { path: '^packages/common/src/testing/' },
    },
    {
      name: 'api-knows-no-web',
      severity: 'error',
      from: { path: '^packages/api/' },
      to: { path: '^(packages/web|infra)/', pathNot: '^infra/fakes/' },
    },
    {
      name: 'api-source-knows-no-fake',
      comment: 'In production the same code reaches the real services: only tests know the fakes.',
      severity: 'error',
      from: { path: '^packages/api/src/', pathNot: anySpec },
      to: { path: '^infra/' },
    },
    {
      name: 'platform-knows-no-feature',
      comment: 'What every slice stands on knows no slice.',
      severity: 'error',
      from: { path: '^packages/api/src/platform/', pathNot: anySpec },
      to: { path: '^packages/api/src/(features/|migrations/|(main|app|compose)[.]ts$)' },
    },
    {
      name: 'feature-knows-no-composition',
      comment: 'Only compose.ts wires objects; a feature is handed what it needs.',
      severity: 'error',
      from: { path: '^packages/api/src/features/', pathNot: anySpec },
      to: { path: '^packages/api/src/(migrations/|(main|app|compose)[.]ts$)' },
    },
    {
      name: 'api-slice-by-its-public-file',
      comment: 'A slice reaches another only through features/<slice>/<slice>-public.ts.',
      severity: 'error',
      from: { path: '^packages/api/src/features/([^/]+)/', pathNot: anySpec },
      to: {
        path: '^packages/api/src/features/([^/]+)/',
        pathNot: '^packages/api/src/features/($1/|([^/]+)/[^/]+-public[.]ts$)',
      },
    },
    {
      name: 'web-knows-no-server',
      severity: 'error',
      from: { path: '^packages/web/src/' },
      to: { path: '^(packages/api|infra)/' },
    },
    {
      name: 'web-has-no-node',
      severity: 'error',
      from: { path: '^packages/web/src/', pathNot: anySpec },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'web-ground-knows-no-slice',
      comment: 'platform/ and ui/ are what slices stand on.',
      severity: 'error',
      from: { path: '^packages/web/src/app/(platform|ui)/', pathNot: anySpec },
      to: { path: '^packages/web/src/app/', pathNot: '^packages/web/src/app/(platform|ui)/' },
    },
    {
      name: 'web-ui-knows-no-state',
      comment: 'Our parts show what they are given.',
      severity: 'error',
      from: { path: '^packages/web/src/app/ui/', pathNot: anySpec },
      to: {
        path: '(^packages/web/src/app/platform/.*(state|api|session|store|effects)|node_modules/@ngrx/)',
      },
    },
    {
      name: 'web-slice-by-its-public-file',
      comment: 'A slice reaches another only through <slice>/<slice>-public.ts, and the shell not at all.',
      severity: 'error',
      from: { path: '^packages/web/src/app/(?!(?:shell|platform|ui)/)([^/]+)/', pathNot: anySpec },
      to: {
        path: '^packages/web/src/app/[^/]+/',
        pathNot: '^packages/web/src/app/($1/|(platform|ui)/|[^/]+/[^/]+-public[.]ts$)',
      },
    },
    {
      name: 'shipped-code-needs-no-test-tool',
      severity: 'error',
      from: {
        path: '^(packages/[^/]+/src|infra)/',
        pathNot: [anySpec, '[.]config[.]'],
      },
      to: { dependencyTypes: ['npm-dev'], path: 'node_modules/(jest|supertest|fast-check|@playwright)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(dist|coverage|[.]angular)/' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'default'],
      mainFields: ['module', 'main', 'types'],
    },
  },
};
