import { spawn } from 'node:child_process'
import { checkoutFolder } from './checkout.mjs'
import { endProcess, identityOf } from './processes.mjs'

/**
 * Runs Node.js with our own stdin, stdout and stderr.
 * @param {readonly string[]} args
 * @param {{ lifecycle: import('./lifecycle.mjs').Lifecycle, env?: NodeJS.ProcessEnv }} context
 * @returns {Promise<number>} its exit code; 128 after a signal
 */
export function runThrough(args, { lifecycle, env = process.env }) {
  return new Promise((resolve, reject) => {
    lifecycle.assertGoing()
    const child = spawn(process.execPath, args, { cwd: checkoutFolder, env, stdio: 'inherit' })
    const self = identityOf(child.pid ?? 0)
    const forget = lifecycle.add(async () => void (await endProcess(self, [['SIGTERM', 5000], ['SIGKILL', 5000]])))
    child.once('error', reject)
    child.once('exit', (code) => {
      forget()
      resolve(code ?? 128)
    })
  })
}
