import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { startDevelopment } = await import('./lib/startDevelopment.mjs')

await runMain((lifecycle) => startDevelopment({ lifecycle }), { interruptCode: 0 })
