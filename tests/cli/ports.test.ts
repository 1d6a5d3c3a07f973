import { createServer } from 'node:net'
import type { AddressInfo, Server } from 'node:net'
import { afterEach, describe, expect, it } from 'vitest'
import { OneLine } from '../../server/cli/lib/OneLine.mjs'
import { chosenPort } from '../../server/cli/lib/chosenPort.mjs'
import { freePort, portProblem } from '../../server/cli/lib/freePort.mjs'

const host = '127.0.0.1'
const open: Server[] = []

const occupy = (port = 0): Promise<number> =>
  new Promise((resolve) => {
    const server = createServer()
    open.push(server)
    server.listen(port, host, () => resolve((server.address() as AddressInfo).port))
  })

afterEach(() => open.splice(0).forEach((server) => server.close()))

describe('freePort', () => {
  it('gives a port on which a server can listen', async () => {
    const port = await freePort()
    expect(await occupy(port)).toBe(port)
  })
})

describe('portProblem', () => {
  it('names the reason where the port is taken', async () => {
    expect(await portProblem(await occupy(), host)).toBe('EADDRINUSE')
  })
})

describe('chosenPort', () => {
  it('takes the one asked for', async () => {
    const port = await freePort()
    expect(await chosenPort({ asked: String(port), usual: 4310, host })).toBe(port)
  })

  it('goes on to the next where the usual one is taken', async () => {
    const taken = await occupy()
    const chosen = await chosenPort({ asked: undefined, usual: taken, host })
    expect(chosen).toBeGreaterThan(taken)
  })

  it('refuses a taken one that was asked for, in one line', async () => {
    const taken = await occupy()
    await expect(chosenPort({ asked: String(taken), usual: 4310, host })).rejects.toThrow(new OneLine(`Port ${taken} is taken: choose another with PORT, or stop what uses it.`))
  })

  it.each(['abc', '-1', '70000', '80 80', '1e3'])('refuses "%s"', async (asked) => {
    await expect(chosenPort({ asked, usual: 4310, host })).rejects.toThrow(OneLine)
  })
})
