import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { parseTestArguments } = await import('./lib/testArguments.mjs')
const { runTests } = await import('./lib/runTests.mjs')

await runMain((lifecycle) => runTests({ lifecycle, wish: parseTestArguments(process.argv.slice(2)) }))
