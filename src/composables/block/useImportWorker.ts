import { onBeforeUnmount } from 'vue'
import type { Message } from '../../../shared/contract/common.ts'
import type { Candidate, ImportOptions, ReadFile } from '../../../shared/importing/importTypes.ts'
import type { ImportGround } from '../../../shared/importing/judgeShapes.ts'
import type { ImportAnswer, ImportAsk } from '../../workers/importWorker.ts'

/** Longer than any file within the limits takes on a slow phone. */
const PATIENCE_MS = 30_000

/** A file that cannot be read, in words. */
export class ImportRefusal extends Error {
  readonly words: Message

  constructor(words: Message) {
    super(words.id)
    this.words = words
  }
}

/** Reads and judges files beside the page, which stays free; what takes too long is stopped. */
export interface ImportWorker {
  /** @throws {ImportRefusal} */
  read(bytes: Uint8Array): Promise<ReadFile>
  /** @throws {ImportRefusal} */
  judge(options: ImportOptions, ground: ImportGround): Promise<Candidate[]>
}

export function useImportWorker(): ImportWorker {
  let worker: Worker | null = null
  let before: Promise<unknown> = Promise.resolve()

  function stop(): void {
    worker?.terminate()
    worker = null
  }
  onBeforeUnmount(stop)

  function ask(question: ImportAsk): Promise<ImportAnswer> {
    worker ??= new Worker(new URL('../../workers/importWorker.ts', import.meta.url), { type: 'module' })
    const asked = worker
    return new Promise((resolve, reject) => {
      const tooLong = setTimeout(() => {
        stop()
        reject(new ImportRefusal({ id: 'importing.fault.slow', params: {} }))
      }, PATIENCE_MS)
      asked.onmessage = ({ data }: MessageEvent<ImportAnswer>) => {
        clearTimeout(tooLong)
        if (data.done === 'fault') reject(new ImportRefusal(data.words))
        else resolve(data)
      }
      asked.onerror = () => {
        clearTimeout(tooLong)
        stop()
        reject(new ImportRefusal({ id: 'importing.fault.unreadable', params: {} }))
      }
      asked.postMessage(question)
    })
  }

  /** One question after the other: an answer belongs to the question before it. */
  function inTurn<Answer>(work: () => Promise<Answer>): Promise<Answer> {
    const mine = before.then(work, work)
    before = mine.catch(() => undefined)
    return mine
  }

  return {
    read: (bytes) => inTurn(async () => {
      stop()
      const answer = await ask({ do: 'read', bytes })
      if (answer.done !== 'read') throw new ImportRefusal({ id: 'importing.fault.unreadable', params: {} })
      return answer.file
    }),
    judge: (options, ground) => inTurn(async () => {
      const answer = await ask({ do: 'judge', options, ground })
      if (answer.done !== 'judge') throw new ImportRefusal({ id: 'importing.fault.unreadable', params: {} })
      return answer.candidates
    }),
  }
}
