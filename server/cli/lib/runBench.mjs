import { resolve } from 'node:path'
import { buildIfStale, serverEntry } from './buildIfStale.mjs'
import { inCheckout } from './checkout.mjs'
import { ensurePackages } from './packages.mjs'
import { runThrough } from './runThrough.mjs'
import { say } from './say.mjs'
import { ensureSystemPackages } from './systemPackages.mjs'
import { startThrowAwayDatabase } from './throwAwayDatabase.mjs'
import { makeThrowAwayFolder } from './throwAwayFolder.mjs'

/**
 * Measures the product against bare baselines, on a database that is thrown away.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, wish: { json: string | undefined, only: readonly string[], quick: boolean } }} run
 * @returns {Promise<number>} exit code: 1 where an answer of ours and of a baseline differ, never for a figure
 */
export async function runBench({ lifecycle, wish: { json, only, quick } }) {
  await ensurePackages({ lifecycle, say })
  await ensureSystemPackages(only.includes('map') ? ['postgresql', 'chromium-headless-shell'] : ['postgresql'], { lifecycle, say })
  const folder = await makeThrowAwayFolder(lifecycle)
  const [{ adminUrl, secrets }] = await Promise.all([startThrowAwayDatabase({ folder, lifecycle, say }), buildIfStale({ lifecycle, say })])
  const kept = Object.entries(process.env).filter(([name]) => !/^(PG.*|DATABASE_URL|DATABASE_OWNER_URL|FIXED_CLOCK|PUBLIC_URL|LOG_FILE)$/.test(name))
  const env = {
    ...Object.fromEntries(kept),
    NODE_ENV: 'production',
    TEST_DATABASE_ADMIN_URL: adminUrl, TEST_OWNER_PASSWORD: secrets.ownerPassword, TEST_APP_PASSWORD: secrets.appPassword,
    BENCH_SERVER: inCheckout(serverEntry), BENCH_FOLDER: folder,
  }
  const args = [...(json === undefined ? [] : ['--json', resolve(json)]), '--only', only.join(','), ...(quick ? ['--quick'] : [])]
  return runThrough(['--import', 'tsx', 'tests/bench/bench.ts', ...args], { lifecycle, env })
}
