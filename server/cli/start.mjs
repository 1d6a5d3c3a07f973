import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { startAll } = await import('./lib/startAll.mjs')

await runMain((lifecycle) => startAll({ lifecycle }), { interruptCode: 0 })
