import { createHash } from 'node:crypto'
import { connect, createServer } from 'node:net'
import { setTimeout as delay } from 'node:timers/promises'

/**
 * What the holder tells whoever asks.
 * @typedef {{ pid: number, phase: 'starting' | 'running' | 'stopping', url?: string }} Holder
 * @typedef {{ release: () => void }} InstanceLock
 */

const graceMs = 1200
const stoppingLimitMs = 40_000

/**
 * Takes the only place there is for a name on this machine, or says who has it. The name is a socket in the kernel's
 * abstract space: it goes with its process however that ends, so no stale lock is ever left.
 * A holder that is stopping is waited for, any other only for a moment (its own end may be on its way).
 * @param {string} name
 * @param {() => Omit<Holder, 'pid'>} [describe] asked anew for everyone who wants the place
 * @returns {Promise<{ lock: InstanceLock } | { holder: Holder | undefined }>}
 */
export async function takeInstanceLock(name, describe = () => ({ phase: 'running' })) {
  const path = `\0drenchleaf-${createHash('sha256').update(name).digest('hex').slice(0, 32)}`
  const startedAt = performance.now()
  for (;;) {
    const lock = await tryLock(path, describe)
    if (lock !== undefined) return { lock }
    const holder = await askHolder(path)
    const limitMs = holder?.phase === 'stopping' ? stoppingLimitMs : graceMs
    if (performance.now() - startedAt > limitMs) return { holder }
    await delay(100)
  }
}

/**
 * @param {string} path @param {() => Omit<Holder, 'pid'>} describe
 * @returns {Promise<InstanceLock | undefined>}
 */
function tryLock(path, describe) {
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => {
      socket.on('error', () => socket.destroy())
      socket.end(JSON.stringify({ pid: process.pid, ...describe() }))
    })
    server.once('error', (error) => {
      if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EADDRINUSE') resolve(undefined)
      else reject(error)
    })
    server.listen({ path }, () => {
      server.unref()
      resolve({ release: () => void server.close() })
    })
  })
}

/** @param {string} path @returns {Promise<Holder | undefined>} undefined where it does not answer */
function askHolder(path) {
  return new Promise((resolve) => {
    let text = ''
    const socket = connect({ path })
    socket.setTimeout(1000, () => socket.destroy())
    socket.setEncoding('utf8').on('data', (part) => (text += part))
    socket.on('error', () => undefined)
    socket.on('close', () => resolve(parseHolder(text)))
  })
}

/** @param {string} text @returns {Holder | undefined} undefined where it is not all there */
function parseHolder(text) {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}
