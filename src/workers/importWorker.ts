import type { Message } from '../../shared/contract/common.ts'
import type { Candidate, ImportOptions, ReadFile } from '../../shared/importing/importTypes.ts'
import { judgeShapes, type ImportGround } from '../../shared/importing/judgeShapes.ts'
import { ImportFault } from '../../shared/importing/read/importFault.ts'
import { readImport } from '../../shared/importing/read/readImport.ts'

/** What the page asks: read a file, or judge what was read under other options. */
export type ImportAsk = { do: 'read'; bytes: Uint8Array } | { do: 'judge'; options: ImportOptions; ground: ImportGround }
export type ImportAnswer = { done: 'read'; file: ReadFile } | { done: 'judge'; candidates: Candidate[] } | { done: 'fault'; words: Message }

let file: ReadFile | null = null

self.onmessage = ({ data }: MessageEvent<ImportAsk>) => {
  try {
    if (data.do === 'read') {
      file = readImport(data.bytes)
      answer({ done: 'read', file })
    } else if (file !== null) answer({ done: 'judge', candidates: judgeShapes(file, data.options, data.ground) })
  } catch (error) {
    answer({ done: 'fault', words: error instanceof ImportFault ? error.words : { id: 'importing.fault.unreadable', params: {} } })
  }
}

function answer(said: ImportAnswer): void {
  self.postMessage(said)
}
