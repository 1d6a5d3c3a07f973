import { resolve } from 'node:path'
import { OneLine } from './OneLine.mjs'
import { buildIfStale } from './buildIfStale.mjs'
import { startDemoServer } from './demoServer.mjs'
import { ensurePackages } from './packages.mjs'
import { runThrough } from './runThrough.mjs'
import { say } from './say.mjs'
import { ensureSystemPackages } from './systemPackages.mjs'
import { makeThrowAwayFolder } from './throwAwayFolder.mjs'
import { startThrowAwayDatabase } from './throwAwayDatabase.mjs'

/** The moment the demo farm stands at in every picture. */
const fixedClock = '2026-06-16T13:42:00Z'

/**
 * Takes the screenshots of the demo farm into a folder.
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, target: string | undefined }} wish
 * @returns {Promise<number>} exit code
 */
export async function makeShots({ lifecycle, target }) {
  if (target === undefined) throw new OneLine('Say where they go: npm run shots -- DIR')
  await ensurePackages({ lifecycle, say })
  await ensureSystemPackages(['postgresql', 'chromium-headless-shell', 'poppler-utils', 'fonts-noto-core'], { lifecycle, say })
  const folder = await makeThrowAwayFolder(lifecycle)
  const [{ database }] = await Promise.all([startThrowAwayDatabase({ folder, lifecycle, say }), buildIfStale({ lifecycle, say })])
  const { url, password } = await startDemoServer({ folder, database, lifecycle, env: { FIXED_CLOCK: fixedClock } })
  return runThrough(['--import', 'tsx', 'tests/shots/takeShots.ts', url, password, resolve(target)], { lifecycle })
}
