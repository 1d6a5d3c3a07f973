// Preloaded into the server with --import: when the start command is killed, the server closes as on SIGTERM.
import { onParentGone } from './parentWatch.mjs'

onParentGone(() => process.kill(process.pid, 'SIGTERM'))
