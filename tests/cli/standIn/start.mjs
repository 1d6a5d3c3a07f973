// The start command with the stand-in server and nothing to install or build.
import { fileURLToPath } from 'node:url'
import { runMain } from '../../../server/cli/lib/runMain.mjs'
import { startAll } from '../../../server/cli/lib/startAll.mjs'

const entry = fileURLToPath(new URL('./server.mjs', import.meta.url))

await runMain((lifecycle) => startAll({ lifecycle, entry, prepare: () => Promise.resolve() }), { interruptCode: 0 })
