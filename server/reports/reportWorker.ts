import { Writable } from 'node:stream'
import type { WorkerAnswer, WorkerOrder } from './reportMessages.ts'
import { giveBack } from './giveBack.ts'
import { renderReport } from './renderReport.ts'

/** The drawing process: takes orders from the server by messages and answers with the document's bytes. */
function tell(answer: WorkerAnswer): Promise<void> {
  return new Promise((resolve, reject) => {
    if (!process.send) return reject(new Error('started without a channel to the server'))
    process.send(answer, undefined, undefined, (error) => (error ? reject(error) : resolve()))
  })
}

async function draw({ id, job }: WorkerOrder): Promise<void> {
  const sink = new Writable({
    write(bytes: Uint8Array, _encoding, done) {
      tell({ kind: 'chunk', id, bytes }).then(() => done(), done)
    },
  })
  try {
    await renderReport(job, sink)
    await tell({ kind: 'done', id })
  } catch (error) {
    await tell({ kind: 'failed', id, message: error instanceof Error ? error.message : String(error) })
  }
  giveBack()
}

process.on('message', (order: WorkerOrder) => void draw(order))
// The server is gone: nobody is left to draw for.
process.on('disconnect', () => process.exit(0))
// Ctrl-C reaches the whole group; the server ends this process when its last job is out.
process.on('SIGINT', () => undefined)
await tell({ kind: 'ready' })
