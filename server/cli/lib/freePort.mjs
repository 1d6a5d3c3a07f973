import { createServer } from 'node:net'

/**
 * Whether a server could listen there now.
 * @param {number} port @param {string} host
 * @returns {Promise<string | undefined>} the system's error code where it could not
 */
export function portProblem(port, host) {
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', (error) => resolve(/** @type {NodeJS.ErrnoException} */ (error).code ?? 'unknown'))
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(undefined)))
  })
}

/**
 * A port that the system says is free; never one that a packaged PostgreSQL uses.
 * @param {string} [host]
 * @returns {Promise<number>}
 */
export function freePort(host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen({ port: 0, host, exclusive: true }, () => {
      const address = probe.address()
      probe.close(() => resolve(typeof address === 'object' && address !== null ? address.port : 0))
    })
  })
}
