import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { checkoutFolder, inCheckout } from './checkout.mjs'
import { runCommand } from './runCommand.mjs'
import { countPlaywright, countVitest } from './testCounts.mjs'

/**
 * @typedef {{ folder: string, rest: readonly string[], shown: boolean, env: NodeJS.ProcessEnv,
 *   lifecycle: import('./lifecycle.mjs').Lifecycle }} RunnerContext
 *   folder: of the run; rest: arguments for the runner; shown: whether its output goes straight to ours
 * @typedef {{ name: string, counts: import('./testCounts.mjs').Counts, output: string }} RunnerResult
 */

const minuteMs = 60_000

/** Checks that read the source; each counts as one test. [name, program in node_modules, arguments] */
const staticChecks = /** @type {const} */ ([
  ['types of server, shared, tests', 'typescript/bin/tsc', ['-p', 'tsconfig.json']],
  ['layers and circles', 'dependency-cruiser/bin/dependency-cruise.mjs', ['--config', '.dependency-cruiser.cjs', 'src', 'server', 'shared', 'migrations']],
  ['dead code', 'knip/bin/knip.js', ['--no-progress']],
  ['types of the client', 'vue-tsc/bin/vue-tsc.js', ['-p', 'tsconfig.client.json']],
  ['lint', 'eslint/bin/eslint.js', ['.']],
])

/**
 * @param {RunnerContext} context
 * @returns {(() => Promise<RunnerResult[]>)[]} a run for each check
 */
export function staticRuns({ lifecycle, env, shown }) {
  return staticChecks.map(([name, program, args]) => async () => {
    const done = await runCommand(process.execPath, [inCheckout('node_modules', program), ...args], { cwd: checkoutFolder, env, lifecycle, shown, limitMs: 10 * minuteMs })
    const passed = done.code === 0
    return [{ name, counts: { passed: passed ? 1 : 0, failed: passed ? 0 : 1, skipped: 0 }, output: done.output }]
  })
}

/**
 * @param {string} name of the result @param {readonly string[]} projects of vitest.config.ts
 * @param {RunnerContext} context
 * @returns {Promise<RunnerResult[]>}
 */
export async function runVitest(name, projects, { lifecycle, env, folder, rest, shown }) {
  const file = join(folder, `${name}.json`)
  const args = ['run', ...projects.flatMap((project) => ['--project', project]), '--reporter=default', '--reporter=json', `--outputFile.json=${file}`, ...rest]
  const done = await runCommand(process.execPath, [inCheckout('node_modules/vitest/vitest.mjs'), ...args], { cwd: checkoutFolder, env, lifecycle, shown, limitMs: 20 * minuteMs })
  return [{ name, counts: countVitest(readIfThere(file), done.code), output: done.output }]
}

/** @param {RunnerContext} context @returns {Promise<RunnerResult[]>} */
export async function runPlaywright({ lifecycle, env, folder, rest, shown }) {
  const file = join(folder, 'e2e.json')
  const args = ['test', '--reporter=list,json', ...rest]
  const done = await runCommand(process.execPath, [inCheckout('node_modules/@playwright/test/cli.js'), ...args],
    { cwd: checkoutFolder, env: { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: file }, lifecycle, shown, limitMs: 20 * minuteMs })
  return [{ name: 'e2e', counts: countPlaywright(readIfThere(file), done.code), output: done.output }]
}

/** @param {string} file */
const readIfThere = (file) => (existsSync(file) ? readFileSync(file, 'utf8') : undefined)
