import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { ensurePackages } = await import('./lib/packages.mjs')
const { buildIfStale } = await import('./lib/buildIfStale.mjs')
const { say } = await import('./lib/say.mjs')

await runMain(async (lifecycle) => {
  await ensurePackages({ lifecycle, say })
  await buildIfStale({ lifecycle, say, force: true })
  return 0
})
