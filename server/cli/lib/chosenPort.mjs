import { OneLine } from './OneLine.mjs'
import { freePort, portProblem } from './freePort.mjs'

const triedPorts = 100

/**
 * The port to serve on: the one asked for, or else the first free one from `usual` on. 0 asks for any.
 * @param {{ asked: string | undefined, usual: number, host: string }} wish asked: PORT as given
 * @returns {Promise<number>}
 * @throws {OneLine} where the one asked for is no port or cannot be had
 */
export async function chosenPort({ asked, usual, host }) {
  if (asked === undefined || asked === '') return firstFree(usual, host)
  const port = Number(asked)
  if (!/^\d{1,5}$/.test(asked) || port > 65535) throw new OneLine(`PORT must be a number from 0 to 65535, not "${asked}".`)
  if (port === 0) return freePort(host)
  const problem = await portProblem(port, host)
  if (problem !== undefined) throw new OneLine(explain(problem, port, host))
  return port
}

/** @param {number} usual @param {string} host */
async function firstFree(usual, host) {
  for (let port = usual; port < usual + triedPorts; port++) {
    const problem = await portProblem(port, host)
    if (problem === undefined) return port
    if (problem !== 'EADDRINUSE') throw new OneLine(explain(problem, port, host))
  }
  throw new OneLine(`Ports ${usual} to ${usual + triedPorts - 1} are all taken: choose another with PORT.`)
}

/** @param {string} code @param {number} port @param {string} host */
function explain(code, port, host) {
  if (code === 'EADDRINUSE') return `Port ${port} is taken: choose another with PORT, or stop what uses it.`
  if (code === 'EACCES') return `Port ${port} is not open to this user: choose one above 1023 with PORT.`
  return `Nothing can listen on ${host}, port ${port} (${code}): check HOST and PORT.`
}
