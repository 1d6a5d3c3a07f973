import { buildIfStale } from './buildIfStale.mjs'
import { startDemoServer } from './demoServer.mjs'
import { ensurePackages } from './packages.mjs'
import { say, secondsSince } from './say.mjs'
import { ensureSystemPackages } from './systemPackages.mjs'
import { addCounts, countsLine } from './testCounts.mjs'
import { runPlaywright, runVitest, staticRuns } from './testRunners.mjs'
import { makeThrowAwayFolder } from './throwAwayFolder.mjs'
import { startThrowAwayDatabase } from './throwAwayDatabase.mjs'

/**
 * @typedef {import('./testRunners.mjs').RunnerContext} RunnerContext
 * @typedef {import('./testRunners.mjs').RunnerResult} RunnerResult
 * @typedef {import('./testArguments.mjs').TestKind} TestKind
 */

/**
 * Installs, builds and starts what the kinds need, runs them, and says the counts in the last line.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, wish: { kinds: readonly TestKind[], rest: readonly string[] } }} run
 * @returns {Promise<number>} exit code: 1 where anything failed
 */
export async function runTests({ lifecycle, wish: { kinds, rest } }) {
  const wants = (/** @type {TestKind} */ kind) => kinds.includes(kind)
  await ensurePackages({ lifecycle, say })
  if (kinds.some((kind) => kind !== 'static')) await ensureSystemPackages(['postgresql', 'qpdf', 'poppler-utils'], { lifecycle, say })
  if (wants('unit')) await ensureSystemPackages(['gdal-bin'], { lifecycle, say })
  if (wants('e2e')) await ensureSystemPackages(['chromium-headless-shell', 'fonts-noto-core'], { lifecycle, say })
  const folder = await makeThrowAwayFolder(lifecycle)
  const needsDatabase = wants('api') || wants('e2e')
  const [database] = await Promise.all([
    needsDatabase ? startThrowAwayDatabase({ folder, lifecycle, say }) : undefined,
    needsDatabase ? buildIfStale({ lifecycle, say }) : undefined,
  ])
  const context = { lifecycle, folder, rest, shown: kinds.length === 1, env: testEnvironment(database) }
  const show = async (/** @type {() => Promise<RunnerResult[]>} */ runKind) => {
    const results = await runKind()
    lifecycle.assertGoing() // what was interrupted has no result
    return report(results, context.shown)
  }
  // What reads the source keeps one core busy while the database tests, which mostly wait, use the other.
  const [ofSource, ofCode] = await Promise.all([
    inOrder(wants('static') ? staticRuns(context).map((run) => () => show(run)) : []),
    inOrder([
      ...(wants('unit') ? [() => show(() => runVitest('unit', ['unit', 'client', 'mocked'], context))] : []),
      ...(wants('api') ? [() => show(() => runVitest('api', ['api'], context))] : []),
    ]),
  ])
  const ofBrowser = wants('e2e') && database !== undefined ? await show(() => runBrowser(context, database.database)) : []
  const counts = addCounts([...ofSource, ...ofCode, ...ofBrowser].map((result) => result.counts))
  await lifecycle.stop()
  process.stdout.write(`${countsLine(counts)}\n`)
  return counts.failed > 0 ? 1 : 0
}

/** @param {readonly (() => Promise<RunnerResult[]>)[]} runs */
async function inOrder(runs) {
  const results = []
  for (const run of runs) results.push(...(await run()))
  return results
}

/** @param {RunnerContext} context @param {import('./ownDatabase.mjs').Database} database @returns {Promise<RunnerResult[]>} */
async function runBrowser(context, database) {
  const { folder, lifecycle } = context
  try {
    const { url, password } = await startDemoServer({ folder, database, lifecycle })
    return await runPlaywright({ ...context, env: { ...context.env, E2E_URL: url, E2E_PASSWORD: password, E2E_DATABASE_URL: database.databaseUrl, E2E_DATABASE_OWNER_URL: database.databaseOwnerUrl } })
  } catch (error) {
    if (lifecycle.stopping) throw error
    return [{ name: 'e2e', counts: { passed: 0, failed: 1, skipped: 0 }, output: String(error) }]
  }
}

/**
 * @param {import('./throwAwayDatabase.mjs').ThrowAwayDatabase | undefined} database
 * @returns {NodeJS.ProcessEnv}
 */
function testEnvironment(database) {
  const kept = Object.entries(process.env).filter(([name]) => !/^(NODE_ENV|NO_COLOR|FORCE_COLOR|PG.*|DATABASE_URL|DATABASE_OWNER_URL|FIXED_CLOCK|PUBLIC_URL)$/.test(name))
  return {
    ...Object.fromEntries(kept),
    ...(process.stdout.isTTY ? { FORCE_COLOR: '1' } : { NO_COLOR: '1' }), // the runners write to a pipe of ours
    ...(database && {
      TEST_DATABASE_ADMIN_URL: database.adminUrl,
      TEST_OWNER_PASSWORD: database.secrets.ownerPassword,
      TEST_APP_PASSWORD: database.secrets.appPassword,
    }),
  }
}

/** @param {RunnerResult[]} results @param {boolean} shown whether the output has been seen already */
function report(results, shown) {
  for (const { name, counts, output } of results) {
    if (counts.failed > 0 && !shown) process.stdout.write(`\n${output.trimEnd()}\n\n`)
    say(`Tests, ${name}`, `${countsLine(counts)} (${secondsSince(0)} after the start)`)
  }
  return results
}
