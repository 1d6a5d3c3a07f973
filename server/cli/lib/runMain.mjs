import { createLifecycle } from './lifecycle.mjs'
import { OneLine, fileProblem } from './OneLine.mjs'
import { onParentGone } from './parentWatch.mjs'

/**
 * Runs a command of the checkout: signals stop what was started and end it with `interruptCode`; a OneLine is printed
 * alone and ends it with 1. Under npm the end of npm counts as a signal, so that nothing is left when npm is killed.
 * @param {(lifecycle: import('./lifecycle.mjs').Lifecycle) => Promise<number>} main gives the exit code
 * @param {{ interruptCode?: number }} [options]
 */
export async function runMain(main, { interruptCode = 130 } = {}) {
  const lifecycle = createLifecycle()
  let isInterrupted = false
  const interrupt = async () => {
    isInterrupted = true
    await lifecycle.stop()
    process.exit(interruptCode)
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, interrupt)
  if (process.env.npm_lifecycle_event !== undefined) onParentGone(interrupt)
  ignoreClosedOutput()
  try {
    const code = await main(lifecycle)
    await lifecycle.stop()
    if (!isInterrupted) process.exit(code)
  } catch (error) {
    if (isInterrupted) return
    printError(error)
    await lifecycle.stop()
    process.exit(1)
  }
}

/** @param {unknown} error */
function printError(error) {
  const line = error instanceof OneLine ? error.message : fileProblem(error)
  console.error(line ?? error)
}

/** Whoever reads our output may go away (`npm start | head -1`); what was started goes on. */
function ignoreClosedOutput() {
  for (const stream of [process.stdout, process.stderr]) {
    stream.on('error', (error) => {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EPIPE') throw error
    })
  }
}
