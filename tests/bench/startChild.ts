import { spawn } from 'node:child_process'
import { createInterface } from 'node:readline'

/** A server of its own process; follows this one when it ends. */
export interface Child { url: string; stop(): Promise<void> }

/** Starts a server that prints `READY {"url":…}`. @throws {Error} where it ends before. */
export async function startChild(args: readonly string[], env: NodeJS.ProcessEnv): Promise<Child> {
  const child = spawn(process.execPath, args, { env: { ...process.env, ...env }, stdio: ['ignore', 'pipe', 'inherit'] })
  const ended = new Promise<void>((resolve) => { child.once('exit', () => { resolve() }) })
  const leave = (): void => { child.kill() }
  process.once('exit', leave)
  const url = await new Promise<string>((resolve, reject) => {
    createInterface({ input: child.stdout }).on('line', (line) => {
      if (line.startsWith('READY ')) resolve((JSON.parse(line.slice('READY '.length)) as { url: string }).url)
    })
    void ended.then(() => { reject(new Error(`${args.join(' ')} did not start`)) })
  })
  return { url, stop: async () => { process.off('exit', leave); child.kill(); await ended } }
}
