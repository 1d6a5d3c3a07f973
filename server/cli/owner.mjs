import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { makeOwner } = await import('./lib/makeOwner.mjs')

await runMain((lifecycle) => makeOwner({ lifecycle, mail: process.argv[2] }))
