import { cruise, type ICruiseResult, type IForbiddenRuleType } from 'dependency-cruiser'

const pure = '^shared/(units|recordings|mechanics|statistics)/'
const unitTest = '\\.test\\.tsx?$'
/** The packages that the pure folders may use: no clock, no randomness, no input or output of their own. */
const purePackages = 'node_modules/(@types/)?(papaparse|saxes|simple-statistics)/'

/**
 * The three import rules of the project, by pattern, so that a new folder is covered on the day it appears.
 * Each is proved in import-rules.test.ts by a violation planted for it.
 */
export const importRules: IForbiddenRuleType[] = [
  {
    name: 'purity',
    comment: 'The science imports itself and two packages: no Node.js, DOM, network, or upper layer.',
    severity: 'error',
    from: { path: pure, pathNot: unitTest },
    to: { pathNot: [pure, purePackages] },
  },
  {
    name: 'direction-shared',
    comment: 'shared is under everything, and knows nothing of it.',
    severity: 'error',
    from: { path: '^shared/' },
    to: { path: '^(server|src)/' },
  },
  {
    name: 'direction-src',
    comment: 'The client reaches the server over HTTP only.',
    severity: 'error',
    from: { path: '^src/' },
    to: { path: '^server/' },
  },
  {
    name: 'direction-server',
    comment: 'The server knows nothing of the client’s sources.',
    severity: 'error',
    from: { path: '^server/' },
    to: { path: '^src/' },
  },
  {
    name: 'direction-tests',
    comment: 'Product code needs neither tests nor invented data.',
    severity: 'error',
    from: { path: '^(shared|server|src)/', pathNot: unitTest },
    to: { path: '^(tests|seed)/' },
  },
  {
    name: 'direction-unit-tests',
    comment: 'A unit test may use the builders of seed and the harness of tests/setup, and no other test.',
    severity: 'error',
    from: { path: '^(shared|server|src|seed)/' },
    to: { path: '^tests/(?!setup/)' },
  },
  {
    name: 'direction-queries-of-others',
    comment: 'A module uses another’s service, never its queries.',
    severity: 'error',
    from: { path: '^server/modules/([^/]+)/' },
    to: { path: '^server/modules/[^/]+/[^/]+\\.queries\\.ts$', pathNot: '^server/modules/$1/' },
  },
  {
    name: 'direction-queries-from-outside',
    comment: 'Outside the modules, too, the way to a module’s data is its service.',
    severity: 'error',
    from: { path: '^(server|seed)/', pathNot: '^server/modules/' },
    to: { path: '^server/modules/.*\\.queries\\.ts$' },
  },
  {
    name: 'no-cycles',
    comment: 'Two files that need each other are one file, or three.',
    severity: 'error',
    from: {},
    to: { circular: true },
  },
]

/**
 * Every import in the product's folders that breaks a rule, as "rule: from → to".
 * @param baseDir the folder that holds shared, server, src, seed and tests
 */
export async function findForbiddenImports(baseDir: string, folders: string[]): Promise<string[]> {
  const { output } = await cruise(folders, {
    baseDir,
    validate: true,
    ruleSet: { forbidden: importRules },
    doNotFollow: { path: 'node_modules' },
    // Type imports count: an upside-down type is an upside-down dependency.
    tsPreCompilationDeps: true,
  })
  const { summary } = output as ICruiseResult
  return summary.violations.map(({ rule, from, to }) => `${rule.name}: ${from} → ${to}`)
}
