import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { makeShots } = await import('./lib/makeShots.mjs')

await runMain((lifecycle) => makeShots({ lifecycle, target: process.argv[2] }))
