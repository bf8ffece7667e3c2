/** Direction rules: each arrow of the tree's plan, with why it runs that way. */

const testFiles = '[.](test|long)[.]tsx?$';

/** A rule that files under `from` may not reach files under `to`, but those of `except`. */
function never(name, comment, from, to, except) {
  const source = { path: from, pathNot: testFiles };
  const target = except ? { path: to, pathNot: except } : { path: to };
  return { name, comment, severity: 'error', from: source, to: target };
}

/** The engine's stages in the order of its pipeline; each may import those before it. */
const stages = ['diagnostics', 'units', 'physics', 'script', 'compile', 'draws', 'assay', 'responses'];

const pipeline = stages
  .slice(0, -1)
  .map((stage, index) =>
    never(
      `engine-${stage}-looks-back-only`,
      'The engine is a pipeline: a stage that knew a later one could not be understood or tried without it.',
      `^shared/engine/${stage}/`,
      `^shared/engine/(${stages.slice(index + 1).join('|')})/`,
    ),
  );

module.exports = {
  forbidden: [
    {
      name: 'no-circles',
      comment: 'Two files that need each other are one thing in two places.',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'no-unresolved',
      comment: 'An import that leads nowhere fails only when it is reached.',
      severity: 'error',
      from: {},
      // mdast is a package of types alone.
      to: { couldNotResolve: true, pathNot: '^mdast$' },
    },
    {
      name: 'shared-is-pure',
      comment: 'Browser, server and threads all run shared code, so it may count on none of them.',
      severity: 'error',
      from: { path: '^shared/', pathNot: testFiles },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'shared-knows-no-frame',
      comment: 'Shared code is reckoning and agreement; screens, requests and rows belong elsewhere.',
      severity: 'error',
      from: { path: '^shared/', pathNot: testFiles },
      to: { path: 'node_modules/(react|react-dom|express|drizzle-orm|mysql2|jsdom)/' },
    },
    never(
      'shared-stands-alone',
      'Shared code is what the two sides have in common; it can know neither.',
      '^shared/',
      '^(server|src)/',
    ),
    never(
      'server-and-client-meet-in-shared',
      'What the server tells the client goes through the contracts; code across would carry secrets or Node along.',
      '^src/',
      '^server/',
    ),
    never(
      'client-and-server-meet-in-shared',
      'The server must start and be tested without the client’s code.',
      '^server/',
      '^src/',
    ),
    never(
      'engine-imports-itself-alone',
      'The engine is the part others may one day use without the rest.',
      '^shared/engine/',
      '^(shared|server|src)/',
      '^shared/engine/',
    ),
    {
      name: 'engine-uses-few-packages',
      comment: 'Each package in the engine is one whose numbers must be trusted.',
      severity: 'error',
      from: { path: '^shared/engine/', pathNot: testFiles },
      to: { path: 'node_modules/', pathNot: 'node_modules/(mathjs|zod)/' },
    },
    {
      name: 'engine-by-its-index',
      comment: 'Stages may be rearranged as long as the index keeps its promises.',
      severity: 'error',
      from: { path: '^(shared|server|src)/', pathNot: ['^shared/engine/', testFiles] },
      to: { path: '^shared/engine/', pathNot: '^shared/engine/index[.]ts$' },
    },
    ...pipeline,
    never(
      'domain-imports-nothing',
      'Lives and abilities are pure rules.',
      '^shared/domain/',
      '.',
      '^shared/domain/',
    ),
    never(
      'errors-import-nothing-of-ours',
      'Everything may throw them.',
      '^shared/errors/',
      '^(shared|server|src)/',
      '^shared/errors/',
    ),
    never(
      'contracts-rest-on-agreements',
      'Contracts say what travels: they rest on domain, errors, engine and the printable model, and do no work.',
      '^shared/contracts/',
      '^shared/',
      '^shared/(contracts/|domain/|errors/|engine/|sheet/model[.]ts$)',
    ),
    never(
      'sheet-knows-engine-alone',
      'One printable model serves screen and document, whatever asks for it.',
      '^shared/sheet/',
      '^shared/',
      '^shared/(sheet|engine)/',
    ),
    {
      name: 'a-feature-calls-services',
      comment: 'A feature’s queries keep its tables’ rules; another feature asks its service.',
      severity: 'error',
      from: { path: '^server/features/([^/]+)/', pathNot: testFiles },
      to: { path: '^server/features/.*queries', pathNot: '^server/features/$1/' },
    },
    {
      name: 'routes-ask-services',
      comment: 'Routes speak HTTP, services do the work, queries speak SQL.',
      severity: 'error',
      from: { path: '^server/features/.*routes[.]ts$' },
      to: { path: '^server/features/.*queries[.]ts$' },
    },
    {
      name: 'queries-ask-nobody',
      comment: 'SQL knows neither the work it is for nor the request it came by.',
      severity: 'error',
      from: { path: '^server/features/.*queries[.]ts$' },
      to: { path: '^server/features/.*(service|routes)[.]ts$' },
    },
    never(
      'export-knows-no-database',
      'Documents are made of a sheet alone, in any thread.',
      '^server/export/',
      '(^server/(db|features|http|jobs|context)|node_modules/(drizzle-orm|mysql2)/)',
    ),
    never(
      'workers-know-no-database',
      'A thread gets plain data and gives plain data; it can be killed at any moment.',
      '^server/workers/',
      '(^server/(db|features|http|jobs|context)|node_modules/(drizzle-orm|mysql2)/)',
    ),
    never(
      'setup-stands-before-packages',
      'The start runs before anything is installed or built.',
      '^server/setup/',
      '^(shared|src|server)/',
      '^server/setup/',
    ),
    {
      name: 'client-features-stand-apart',
      comment: 'A screen can change without another; pages put them together.',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/', pathNot: testFiles },
      to: { path: '^src/features/', pathNot: '^src/features/$1/' },
    },
    never(
      'features-know-no-page',
      'Pages are made of features, not the other way round.',
      '^src/features/',
      '^src/(app|main)',
    ),
    never(
      'components-fetch-nothing',
      'A component shows what it is given, wherever it stands.',
      '^src/components/',
      '^src/(features|app)/',
    ),
    never(
      'lib-knows-no-screen',
      'The client’s tools serve every screen.',
      '^src/lib/',
      '^src/(features|app|components)/',
    ),
    {
      name: 'product-knows-no-test',
      comment: 'What only tests need is not shipped.',
      severity: 'error',
      from: { path: '^(shared|server|src)/', pathNot: testFiles },
      to: { path: '(^tests/|[.](test|long)[.]tsx?$)' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.json'],
    },
  },
};
