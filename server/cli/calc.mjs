import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { existsSync } = await import('node:fs')
const { runMain } = await import('./lib/runMain.mjs')
const { ensurePackages } = await import('./lib/packages.mjs')
const { isBuildFresh } = await import('./lib/buildIfStale.mjs')
const { inCheckout } = await import('./lib/checkout.mjs')
const { runThrough } = await import('./lib/runThrough.mjs')
const { sayAside } = await import('./lib/say.mjs')

const built = inCheckout('dist/server/server/cli/calc.js')

await runMain(async (lifecycle) => {
  await ensurePackages({ lifecycle, say: sayAside })
  const program = existsSync(built) && isBuildFresh() ? [built] : ['--import', 'tsx', inCheckout('server/cli/calc.ts')]
  return runThrough([...program, ...process.argv.slice(2)], { lifecycle })
})
