import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { readFileSync } from 'node:fs'
import { createServer } from 'node:net'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { fileURLToPath } from 'node:url'
import { afterEach, describe, expect, it } from 'vitest'
import { freePort, portProblem } from '../../server/cli/lib/freePort.mjs'
import { processesIn } from '../../server/cli/lib/processes.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const data = join(temporaryFolder(), 'data')
const program = fileURLToPath(new URL('./standIn/start.mjs', import.meta.url))
const running: ChildProcess[] = []

interface Start { child: ChildProcess; ready: { url: string; seeds: boolean; password: string } | undefined; ended: Promise<unknown[]>; errors: () => string }

/** Starts the command and waits until it serves or has ended. */
async function start(env: NodeJS.ProcessEnv = {}): Promise<Start> {
  const own = { ...process.env, npm_lifecycle_event: undefined, DATA_DIR: data, PORT: '0', ...env }
  const child = spawn(process.execPath, [program], { env: own, stdio: ['ignore', 'pipe', 'pipe'] })
  running.push(child)
  let errors = ''
  child.stderr.setEncoding('utf8').on('data', (text: string) => (errors += text))
  const ended = once(child, 'close')
  const line = new Promise<string | undefined>((resolve) => {
    createInterface({ input: child.stdout }).on('line', (text) => text.startsWith('READY ') && resolve(text))
    void ended.then(() => resolve(undefined))
  })
  const found = await line
  return { child, ready: found === undefined ? undefined : (JSON.parse(found.slice('READY '.length)) as Start['ready']), ended, errors: () => errors.trim() }
}

const pidIn = (name: string): number => Number(/\d+/.exec(readFileSync(join(data, name), 'utf8'))?.[0])
const databaseProcesses = (): unknown[] => processesIn(join(data, 'postgres'))

afterEach(async () => {
  for (const child of running.splice(0)) {
    if (child.exitCode !== null || child.signalCode !== null) continue
    child.kill('SIGTERM')
    await once(child, 'close')
  }
})

describe('start', () => {
  it.each(['SIGINT', 'SIGTERM'] as const)('serves and leaves nothing after %s', async (signal) => {
    const { child, ready, ended } = await start()
    expect(await (await fetch(ready?.url ?? '')).json()).toEqual({ status: 'ok' })
    expect(ready).toMatchObject({ seeds: true, password: expect.stringMatching(/^[a-z2-9-]{14}$/) as string })
    child.kill(signal)
    expect(await ended).toEqual([0, null])
    expect(databaseProcesses()).toEqual([])
    expect(await portProblem(Number(new URL(ready?.url ?? '').port), '127.0.0.1')).toBeUndefined()
  })

  it('says in one line where it runs already', async () => {
    const first = await start()
    const second = await start()
    expect(await second.ended).toEqual([1, null])
    expect(second.errors()).toBe(`Drenchleaf already runs at ${first.ready?.url} (process ${first.child.pid}).`)
  })

  it('says in one line that the port is taken', async () => {
    const other = createServer()
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve))
    const { port } = other.address() as AddressInfo
    const { ended, errors } = await start({ PORT: String(port) })
    expect(await ended).toEqual([1, null])
    expect(errors()).toBe(`Port ${port} is taken: choose another with PORT, or stop what uses it.`)
    other.close()
  })

  it('comes up on the same port after it was killed itself', async () => {
    const PORT = String(await freePort())
    const first = await start({ PORT })
    first.child.kill('SIGKILL')
    await first.ended
    const second = await start({ PORT })
    expect(second.ready).toEqual(first.ready)
  })

  it.each([
    ['the server', 'server.pid', /^The server stopped by itself \(SIGKILL\);/],
    ['the database', 'postgres/postmaster.pid', /^The database stopped by itself;/],
  ])('ends with one line where %s is killed, and starts again', async (_, pidFile, line) => {
    const first = await start()
    process.kill(pidIn(pidFile), 'SIGKILL')
    expect(await first.ended).toEqual([1, null])
    expect(first.errors()).toMatch(line)
    expect(first.errors().split('\n')).toHaveLength(1)
    expect((await start()).ready).toBeDefined()
  })

  it('uses a database that is named, and seeds nothing there', async () => {
    const { ready } = await start({ DATABASE_URL: 'postgresql://a@127.0.0.1/x', DATABASE_OWNER_URL: 'postgresql://b@127.0.0.1/x' })
    expect(ready?.seeds).toBe(false)
    expect(databaseProcesses()).toEqual([])
  })

  it('refuses half of a database', async () => {
    const { ended, errors } = await start({ DATABASE_URL: 'postgresql://a@127.0.0.1/x', DATABASE_OWNER_URL: undefined })
    expect(await ended).toEqual([1, null])
    expect(errors()).toMatch(/^DATABASE_OWNER_URL is missing/)
  })
})
