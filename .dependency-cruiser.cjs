// Who may import whom. Imports point down only; each rule's comment names the cure.
const PURE = '^lib/(rules|checklist|inspection|pass|planning|permissions|sync/core)/'
const BASE = 'rules|checklist|inspection|pass|planning|permissions|contracts|sync|http|platform'
/** Anything in lib that is not one of the base folders is a feature. */
const FEATURE = `^lib/(?!(?:${BASE})/)([^/]+)/`
const TEST = '\\.test\\.tsx?$'

/** `from` may import only the folders named, itself, and packages. */
function only(name, from, allowed, comment) {
  const inside = ['app', 'db', 'lib', 'checklists'].map((each) => `${each}/`).join('|')
  return { name, severity: 'error', comment, from: { path: from }, to: { path: `^(${inside})`, pathNot: [from, ...allowed] } }
}

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', comment: 'Move what both need down into a file of its own.', from: {}, to: { circular: true } },
    {
      name: 'no-orphans',
      severity: 'error',
      comment: 'Nothing imports it: use it or delete it.',
      from: {
        orphan: true,
        pathNot: [
          '\\.d\\.ts$',
          '/(page|layout|route|loading|error|global-error|not-found|template|default|manifest|icon|apple-icon|robots|sitemap)[.]tsx?$',
          '^(proxy|instrumentation|instrumentation-client)\\.ts$',
          '^db/(seed|scenarios/)',
          '^db/migrations/',
          '\\.(json|css)$',
        ],
      },
      to: {},
    },
    only('rules-are-ground', '^lib/rules/', [], 'lib/rules imports nothing of ours.'),
    only('checklist-on-rules', '^lib/checklist/', ['^lib/rules/'], 'checklist → rules only.'),
    only('inspection-on-checklist', '^lib/inspection/', ['^lib/(checklist|rules)/'], 'inspection → checklist → rules only.'),
    only('pass-is-pure', '^lib/pass/', ['^lib/(inspection|checklist|rules)/'], 'pass → inspection, checklist, rules only.'),
    only('planning-is-pure', '^lib/planning/', ['^lib/(inspection|checklist|rules|pass)/'], 'planning → pure folders only.'),
    only('permissions-are-pure', '^lib/permissions/', ['^lib/(inspection|checklist|rules)/'], 'permissions → pure folders only.'),
    only('contracts-are-shapes', '^lib/contracts/', ['^lib/(inspection|checklist|rules|pass|permissions)/'], 'contracts → shapes and pure folders only.'),
    only('sync-core', '^lib/sync/core/', ['^lib/(inspection|checklist|rules|pass|permissions|contracts)/'], 'sync/core → pure folders and contracts: hand IO in as arguments.'),
    only('sync-client', '^lib/sync/client/', ['^lib/sync/core/', '^lib/(inspection|checklist|rules|pass|permissions|contracts|platform|http)/'], 'sync/client → sync/core, contracts, platform.'),
    only('sync-server', '^lib/sync/server/', ['^lib/sync/core/', '^lib/(inspection|checklist|rules|pass|permissions|contracts|platform)/', '^db/'], 'sync/server → sync/core, permissions, platform, db.'),
    only('http', '^lib/http/', ['^lib/(contracts|permissions|platform)/'], 'http → contracts, permissions, platform.'),
    only('platform', '^lib/platform/', ['^lib/(permissions|contracts)/', '^db/'], 'platform → db, permissions and contracts at most: it stands below the features.'),
    only('ui-knows-no-domain', '^app/_ui/', [], 'app/_ui imports only itself: pass what it shows as props.'),
    only('db-stands-below', '^db/(?!seed|scenarios)', ['^lib/platform/', '^lib/(inspection|checklist|rules|pass|permissions)/'], 'db → platform; only seed and scenarios use commands.'),
    {
      name: 'features-apart',
      severity: 'error',
      comment: 'Features never import each other: compose in app, or move what both need down.',
      from: { path: FEATURE },
      to: { path: FEATURE, pathNot: '^lib/$1/' },
    },
    {
      name: 'nothing-imports-app',
      severity: 'error',
      comment: 'Imports point down only: app is the top floor.',
      from: { path: '^(lib|db)/' },
      to: { path: '^app/' },
    },
    {
      name: 'features-below-http-server',
      severity: 'error',
      comment: 'A feature gives commands and queries; the route composes them with handle().',
      from: { path: FEATURE },
      to: { path: '^lib/http/server' },
    },
    {
      name: 'db-from-few',
      severity: 'error',
      comment: 'Only queries.ts, commands.ts (or files under queries/ and commands/), sync/server, platform, the instrumentation and the seed may touch db.',
      from: { path: '^(app|lib)/', pathNot: ['^lib/[^/]+/(queries|commands)(/|\\.ts$)', '^lib/[^/]+/.*-(query|queries|command|commands)\\.ts$', '^lib/sync/server/', '^lib/platform/'] },
      to: { path: '^db/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'client-reaches-no-db',
      severity: 'error',
      comment: 'A browser file must not reach the database through anything it imports: read through call(contract).',
      from: { path: ['^lib/.*/use-[^/]+\\.tsx?$', '^lib/sync/(client|core)/', '^lib/scanner/', '^app/(_ui|_crew|_walk|bay|sign-on|pit-exit)/(?!.*(page|layout)\\.tsx$)'] },
      to: { path: '^db/|(^|/)node_modules/(better-sqlite3|drizzle-orm|lucia|@node-rs/argon2)/', reachable: true },
    },
    {
      name: 'pure-imports-no-edge',
      severity: 'error',
      comment: 'Pure folders import no node, react, next, drizzle: take it as an argument.',
      from: { path: PURE, pathNot: TEST },
      to: { path: '(^|/)node_modules/(react|react-dom|next|drizzle-orm|better-sqlite3|swr|lucia|server-only|idb-keyval)/' },
    },
    { name: 'pure-imports-no-node', severity: 'error', comment: 'Pure folders import no node module: take it as an argument.', from: { path: PURE }, to: { dependencyTypes: ['core'] } },
    { name: 'no-unresolvable', severity: 'error', comment: 'The file or package is not there.', from: {}, to: { couldNotResolve: true, pathNot: '\\.css$' } },
    { name: 'no-tests-in-source', severity: 'error', comment: 'Tests lean on the source, never the other way.', from: { path: '^(app|lib|db)/', pathNot: '^db/(seed|scenarios)' }, to: { path: '^tests/' } },
    {
      name: 'no-dev-packages',
      severity: 'error',
      comment: 'It would be missing in production: move the package to dependencies.',
      from: { path: '^(app|lib|db)/', pathNot: '^db/(seed|scenarios)' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: '/@types/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'require', 'node', 'default', 'types'], extensions: ['.ts', '.tsx', '.mjs', '.js', '.json', '.css'] },
    reporterOptions: { text: { highlightFocused: true } },
  },
} // prettier-ignore
