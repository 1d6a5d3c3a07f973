import { fork, type ChildProcess } from 'node:child_process'
import { createRequire } from 'node:module'
import { fileURLToPath, pathToFileURL } from 'node:url'

/** What the drawing process may see of the environment: nothing of the database or of any secret. */
const PASSED_ON = ['PATH', 'HOME', 'TMPDIR', 'LANG', 'NODE_ENV', 'SystemRoot']

/** Starts the drawing process, compiled or from source, whichever this file is. */
export function startWorker(): ChildProcess {
  const isSource = import.meta.url.endsWith('.ts')
  const path = fileURLToPath(new URL(isSource ? './reportWorker.ts' : './reportWorker.js', import.meta.url))
  const env = Object.fromEntries(PASSED_ON.flatMap((name) => {
    const value = process.env[name]
    return value === undefined ? [] : [[name, value]]
  }))
  return fork(path, [], {
    env,
    serialization: 'advanced',
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    execArgv: ['--max-old-space-size=512', '--expose-gc', ...(isSource ? ['--import', sourceLoader()] : [])],
  })
}

function sourceLoader(): string {
  return pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href
}
