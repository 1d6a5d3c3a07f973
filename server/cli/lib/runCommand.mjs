import { spawn } from 'node:child_process'

/**
 * @typedef {{ code: number, output: string }} CommandResult code 127 where the command does not exist, 128 after a signal
 * @typedef {{
 *   cwd?: string, env?: NodeJS.ProcessEnv, input?: string, uid?: number, gid?: number,
 *   lifecycle?: import('./lifecycle.mjs').Lifecycle, shown?: boolean, limitMs?: number,
 * }} CommandOptions
 */

/**
 * Runs a command to its end and keeps what it wrote (stdout and stderr as they came).
 * It stands in a process group of its own, which the lifecycle stops with it.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {CommandOptions} [options] shown: its output also goes to ours, unless what it writes is to be kept apart
 * @returns {Promise<CommandResult>}
 */
export function runCommand(command, args, { input, lifecycle, shown, limitMs, ...spawnOptions } = {}) {
  return new Promise((resolve) => {
    lifecycle?.assertGoing()
    const stdin = input === undefined ? 'ignore' : 'pipe'
    const child = spawn(command, args, { ...spawnOptions, detached: true, stdio: [stdin, 'pipe', 'pipe'] })
    let output = ''
    for (const stream of [child.stdout, child.stderr]) {
      stream?.setEncoding('utf8').on('data', (text) => {
        output += text
        if (shown) process.stdout.write(text)
      })
    }
    const closed = new Promise((done) => child.once('close', done))
    const forget = lifecycle?.add(() => stopGroup(child, closed))
    const timer = limitMs === undefined ? undefined : setTimeout(() => {
      output += `\n${command} took longer than ${limitMs / 1000} s and was stopped.\n`
      void stopGroup(child, closed)
    }, limitMs)
    const finish = (/** @type {CommandResult} */ result) => {
      clearTimeout(timer)
      forget?.()
      resolve(result)
    }
    child.once('error', (error) => finish({ code: 127, output: `${output}${error.message}\n` }))
    child.once('close', (code) => finish({ code: code ?? 128, output }))
    child.stdin?.on('error', () => undefined)
    child.stdin?.end(input)
  })
}

/**
 * Ends a whole process group: asked first, killed after five seconds.
 * @param {import('node:child_process').ChildProcess} child
 * @param {Promise<unknown>} closed
 */
async function stopGroup(child, closed) {
  signalGroup(child.pid, 'SIGTERM')
  const timer = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), 5000)
  await closed
  clearTimeout(timer)
  signalGroup(child.pid, 'SIGKILL')
}

/** @param {number | undefined} pid @param {NodeJS.Signals} signal */
function signalGroup(pid, signal) {
  if (pid === undefined) return
  try {
    process.kill(-pid, signal)
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'ESRCH') throw error
  }
}
