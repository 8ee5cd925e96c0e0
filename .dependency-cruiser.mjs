/**
 * Import directions of the house: engine ← sweep ← {contract, verification} ← {server, client}. Everything not listed is forbidden.
 *
 * @param {string} name
 * @param {string} from
 * @param {string[]} allowed
 */
const only = (name, from, allowed) => ({
  name,
  severity: 'error',
  from: { path: from },
  to: { pathNot: allowed },
});

/**
 * @param {string} name
 * @param {string} from
 * @param {string} to
 * @param {string} [except]
 */
const never = (name, from, to, except) => ({
  name,
  severity: 'error',
  from: { path: from },
  to: { path: to, ...(except === undefined ? {} : { pathNot: except }) },
});

const shared = [
  only('engine-imports-only-itself', '^shared/engine/', ['^shared/engine/']),
  only('sweep-imports-only-engine', '^shared/sweep/', ['^shared/(engine|sweep)/']),
  // The published cases and their computations: the engine and the sweep know nothing of how they are checked.
  only('verification-imports-only-engine-and-sweep', '^shared/verification/', [
    '^shared/(engine|sweep|verification)/',
  ]),
  only('contract-imports-only-shared-and-zod', '^shared/contract/', [
    '^shared/(engine|sweep|contract)/',
    '^node_modules/(zod|zod-openapi)/',
  ]),
  // What a reader sees, the same on a page and on paper: words and numbers, then the drawing, then the whole sheet.
  only('print-imports-only-engine-and-contract', '^shared/print/', [
    '^shared/(engine|sweep|contract|print)/',
  ]),
  only('drawing-imports-only-what-it-draws', '^shared/drawing/', [
    '^shared/(engine|sweep|contract|print|drawing)/',
  ]),
  only('sheet-imports-only-shared', '^shared/sheet/', ['^shared/']),
  never(
    'contract-imports-nothing-for-reading',
    '^shared/(engine|sweep|contract)/',
    '^shared/(print|drawing|sheet)/',
  ),
];

const server = [
  never('server-never-imports-client', '^server/', '^client/'),
  // The pool's own threads carry the engine and nothing else: a worker starts in milliseconds. A sheet's and an export's
  // write files.
  only('compute-workers-are-lean', '^server/compute/(?!sheet-|export-)[^/]*worker[.]ts$', [
    '^shared/(engine|sweep)/',
    '^server/compute/',
    '^node_modules/(bcryptjs|piscina)/',
    '^(node:)?(worker_threads|crypto|process|perf_hooks)$',
  ]),
  never(
    'server-base-imports-no-upper-layer',
    '^server/(config|errors|log)[.]ts$',
    '^server/',
    '^server/(config|errors|log)[.]ts$',
  ),
  never(
    'server-plumbing-imports-no-feature',
    '^server/(db|http|mail|files|compute)/',
    '^server/(features/|jobs/worker/|app[.]ts$|main[.]ts$|worker[.]ts$|cli/)',
  ),
  never(
    'job-queue-imports-no-feature',
    '^server/jobs/[^/]+[.]ts$',
    '^server/(features/|app[.]ts$|main[.]ts$|worker[.]ts$|cli/)',
  ),
  never(
    'server-features-import-no-assembly',
    '^server/features/',
    '^server/(jobs/worker/|app[.]ts$|main[.]ts$|worker[.]ts$|cli/)',
  ),
  never(
    'server-features-do-not-see-each-other',
    '^server/features/([^/]+)/',
    '^server/features/',
    '^server/features/$1/',
  ),
  never(
    'job-handlers-import-no-assembly',
    '^server/jobs/worker/',
    '^server/(app|main|worker)[.]ts$|^server/cli/',
  ),
  never('app-does-not-import-main', '^server/app[.]ts$', '^server/main[.]ts$'),
];

const client = [
  never('client-never-imports-server', '^client/', '^(server|drizzle)/'),
  never(
    'client-lib-is-lowest',
    '^client/src/lib/',
    '^client/src/(ui|charts|drawing|sheet|study|section-fields|features|app)/',
  ),
  never(
    'client-ui-imports-only-lib',
    '^client/src/ui/',
    '^client/src/(charts|drawing|sheet|study|section-fields|features|app)/',
  ),
  never(
    'client-charts-import-no-feature',
    '^client/src/(charts|drawing|sheet|study|section-fields)/',
    '^client/src/(features|app)/',
  ),
  never('client-features-import-no-page', '^client/src/features/', '^client/src/app/'),
  never(
    'client-features-do-not-see-each-other',
    '^client/src/features/([^/]+)/',
    '^client/src/features/',
    '^client/src/features/$1/',
  ),
];

const everywhere = [
  { name: 'no-circles', severity: 'error', from: {}, to: { circular: true } },
  { name: 'everything-resolves', severity: 'error', from: {}, to: { couldNotResolve: true } },
  never('product-never-imports-tests', '^(shared|server|client)/', '^(tests|bench)/'),
  {
    name: 'product-never-imports-development-packages',
    severity: 'error',
    from: { path: '^(shared|server|client)/', pathNot: '^server/(cli|compute)/' },
    to: {
      dependencyTypes: ['npm-dev'],
      dependencyTypesNot: ['type-only'],
      pathNot: '^node_modules/(@types|tailwindcss)/',
    },
  },
];

export default {
  forbidden: [...everywhere, ...shared, ...server, ...client],
  options: {
    doNotFollow: { path: '^(node_modules|dist)' },
    exclude: { path: '^dist/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.base.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'default', 'node'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.json', '.css'],
    },
  },
};
