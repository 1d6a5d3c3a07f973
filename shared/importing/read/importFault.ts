import type { Message } from '../../contract/common.ts'

/** Why a file cannot be read, in words: nothing of it is taken. */
export class ImportFault extends Error {
  readonly words: Message

  constructor(code: string, params: Message['params'] = {}) {
    super(code)
    this.words = { id: `importing.fault.${code}`, params }
  }
}
