import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { endProcess, identityOf, isAlive, processesIn } from '../../server/cli/lib/processes.mjs'
import { stopLeftServer } from '../../server/cli/lib/serverProcess.mjs'
import { temporaryFolder } from './temporaryFolder.ts'

const folder = temporaryFolder()

async function idle(code = ''): Promise<{ child: ChildProcess; pid: number }> {
  const child = spawn(process.execPath, ['-e', `${code}; console.log('up'); setInterval(() => 0, 1000)`], { cwd: folder, stdio: ['ignore', 'pipe', 'inherit'] })
  await once(child.stdout, 'data')
  return { child, pid: child.pid ?? 0 }
}

describe('a process and its identity', () => {
  it('is alive until it has ended', async () => {
    const { child, pid } = await idle()
    const self = identityOf(pid)
    expect(isAlive(self)).toBe(true)
    expect(processesIn(folder)).toEqual([self])
    const ended = once(child, 'exit')
    expect(await endProcess(self, [['SIGTERM', 5000]])).toBe(true)
    await ended
    expect(isAlive(self)).toBe(false)
    expect(processesIn(folder)).toEqual([])
  })

  it('is not a later process with the same number', () => {
    expect(isAlive({ pid: process.pid, startTime: '1' })).toBe(false)
  })

  it('is not a number that nothing has', () => {
    expect(isAlive(identityOf(2 ** 30))).toBe(false)
  })

  it('is killed where it does not listen', async () => {
    const { child, pid } = await idle(`process.on('SIGTERM', () => 0)`)
    const ended = once(child, 'exit')
    expect(await endProcess(identityOf(pid), [['SIGTERM', 200], ['SIGKILL', 5000]])).toBe(true)
    expect(await ended).toEqual([null, 'SIGKILL'])
  })
})

describe('stopLeftServer', () => {
  const pidFile = join(folder, 'server.pid')

  it('stops the one that is written down', async () => {
    const { child, pid } = await idle()
    const ended = once(child, 'exit')
    writeFileSync(pidFile, JSON.stringify(identityOf(pid)))
    expect(await stopLeftServer(pidFile)).toBe(true)
    expect(await ended).toEqual([null, 'SIGTERM'])
  })

  it('leaves another process alone that has the number now', async () => {
    const { child, pid } = await idle()
    writeFileSync(pidFile, JSON.stringify({ pid, startTime: '1' }))
    expect(await stopLeftServer(pidFile)).toBe(false)
    expect(child.exitCode ?? child.signalCode).toBeNull()
    child.kill('SIGKILL')
    await once(child, 'exit')
  })

  it.each(['', '{"pid":', '{}'])('passes by a file that was cut short: "%s"', async (text) => {
    writeFileSync(pidFile, text)
    expect(await stopLeftServer(pidFile)).toBe(false)
  })
})
