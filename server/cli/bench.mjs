import { assertNodeVersion } from './lib/nodeVersion.mjs'

assertNodeVersion()
const { runMain } = await import('./lib/runMain.mjs')
const { parseBenchArguments } = await import('./lib/benchArguments.mjs')
const { runBench } = await import('./lib/runBench.mjs')

await runMain((lifecycle) => runBench({ lifecycle, wish: parseBenchArguments(process.argv.slice(2)) }))
