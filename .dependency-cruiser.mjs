/** The arrows between the folders of src. Each rule says why it stands; a pull that needs it gone needs a better plan. */
const to = (...folders) => ({ path: `^src/(${folders.join('|')})/` });

/** @type {import('dependency-cruiser').IConfiguration} */
export default {
  forbidden: [
    {
      name: 'core-imports-only-itself',
      comment:
        'The science and the planning run the same in browser, server, worker and tests, and can be checked by hand: ' +
        'no package, clock, database or framework may come in.',
      severity: 'error',
      from: { path: '^src/core/' },
      to: { pathNot: '^src/core/' },
    },
    {
      name: 'core-stages-in-order',
      comment:
        'A week is worked out in stages, duty, demand, orders, header, house, levelling, schedule, shift; a stage reads what ' +
        'came before it, never what comes after, so that each can be understood alone.',
      severity: 'error',
      from: { path: '^src/core/(quantity|time|steam|plant)/' },
      to: { path: '^src/core/(duty|demand|orders|header|house|levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'duty-before-demand',
      comment: 'Duties are worked out before any load exists (see core-stages-in-order).',
      severity: 'error',
      from: { path: '^src/core/duty/' },
      to: { path: '^src/core/(demand|orders|header|house|levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'demand-before-header',
      comment: 'Demand belongs to one activity; the header sums them afterwards (see core-stages-in-order).',
      severity: 'error',
      from: { path: '^src/core/demand/' },
      to: { path: '^src/core/(orders|header|house|levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'orders-before-the-week',
      comment: 'An order is split by its route alone; where its runs then stand is the week’s business.',
      severity: 'error',
      from: { path: '^src/core/orders/' },
      to: { path: '^src/core/(header|house|levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'the-week-without-orders',
      comment: 'Rules, levelling and load know activities and links, whatever order they came from.',
      severity: 'error',
      from: { path: '^src/core/(header|house|levelling|schedule|shift|pipeline)' },
      to: { path: '^src/core/orders/' },
    },
    {
      name: 'header-before-levelling',
      comment: 'The load is what it is, whoever moves batches about (see core-stages-in-order).',
      severity: 'error',
      from: { path: '^src/core/header/' },
      to: { path: '^src/core/(house|levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'house-before-levelling',
      comment: 'What the boiler house must do follows from loads and firings, whoever moves batches about.',
      severity: 'error',
      from: { path: '^src/core/house/' },
      to: { path: '^src/core/(levelling|schedule|shift|pipeline)' },
    },
    {
      name: 'plans-without-the-house',
      comment: 'Levelling, rules and shifts read the limit that the house gives, never its boilers.',
      severity: 'error',
      from: { path: '^src/core/(levelling|schedule|shift|pipeline)' },
      to: { path: '^src/core/house/' },
    },
    {
      name: 'solver-imports-core-only',
      comment: 'The solver package sits behind core’s port: it knows numbers, not plants, people or pages.',
      severity: 'error',
      from: { path: '^src/solver/' },
      to: { path: '^src/', pathNot: '^src/(core|solver)/' },
    },
    {
      name: 'lp-package-behind-the-port',
      comment: 'One package can be changed for another in one folder only.',
      severity: 'error',
      from: { path: '^(src|scripts)/', pathNot: '^src/solver/' },
      to: { path: 'node_modules/(javascript-lp-solver|highs)/' },
    },
    {
      name: 'contracts-import-core-and-zod-only',
      comment: 'Contracts are read by server and browser alike; anything else would be carried into both.',
      severity: 'error',
      from: { path: '^src/contracts/' },
      to: { pathNot: '^(src/(contracts|core)/|node_modules/zod/)' },
    },
    {
      name: 'components-stay-off-the-server',
      comment: 'What components import may be sent to a browser: no database, no secret, no Node.',
      severity: 'error',
      from: { path: '^src/(components|layouts)/' },
      to: { path: '^src/(server|db|entry|pages)/' },
    },
    {
      name: 'islands-without-node',
      comment: 'Islands run in a browser.',
      severity: 'error',
      from: { path: '^src/(components|contracts)/.*\\.tsx?$' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'islands-without-threads',
      comment: 'The solver runs on a thread of the levelling worker, which Node has and a browser has not.',
      severity: 'error',
      from: { path: '^src/(components|contracts)/' },
      to: { path: '^src/solver/(levellingClient|.*\\.thread)' },
    },
    {
      name: 'server-knows-no-screens',
      comment: 'Services answer pages, jobs and tests; none of them may need a screen for it.',
      severity: 'error',
      from: { path: '^src/(server|db)/' },
      to: to('components', 'layouts', 'pages', 'styles'),
    },
    {
      name: 'tables-know-no-rules',
      comment: 'The tables are imported by tools that know neither aliases nor frameworks; rules live in services.',
      severity: 'error',
      from: { path: '^src/db/' },
      to: { path: '^src/', pathNot: '^src/(db|core|contracts)/' },
    },
    {
      name: 'pages-ask-services',
      comment: 'Queries live in repositories, beside the check of who may ask; a page calls a service.',
      severity: 'error',
      from: { path: '^src/(pages|middleware)' },
      to: to('db'),
    },
    {
      name: 'entry-stands-alone',
      comment: 'The web process wraps the built pages; it is bundled apart from them and shares no state with them.',
      severity: 'error',
      from: { path: '^src/entry/' },
      to: { path: '^src/', pathNot: '^src/entry/' },
    },
    {
      name: 'nothing-imports-pages-or-tests',
      comment:
        'The route table and the tests are ends, not parts. `npm run verify` alone lists the checks that the ' +
        'verification tests hold, so that no figure is typed twice.',
      severity: 'error',
      from: { path: '^(src|scripts)/', pathNot: '^scripts/verify\\.ts$' },
      to: { path: '^(src/pages|tests)/' },
    },
    {
      name: 'no-circles',
      comment: 'Files that import each other in a circle can only be understood together.',
      severity: 'error',
      from: { path: '^(src|scripts)/' },
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'no-unresolved',
      comment: 'An import that leads nowhere fails when it is run.',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true, pathNot: '^astro:' },
    },
    {
      name: 'no-dev-packages-in-the-application',
      comment: 'An installation has no development packages.',
      severity: 'error',
      from: { path: '^src/' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: 'node_modules/@types/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|\\.astro|\\.steadmain)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'node', 'default', 'types'] },
  },
};
