import { now } from '../plugins/clock.ts'
import { device } from '../plugins/device.ts'
import type { Draft } from './draftTypes.ts'

type Typed = Pick<Draft, 'id' | 'kind' | 'farmId' | 'accountId' | 'content'>

const DELAY_MS = 120

/**
 * Writes drafts to this device shortly after each keystroke, and at once when the page is left.
 * The content is copied when it is handed over, so a form may go on changing it.
 */
function createDraftWriter(): { write: (typed: Typed) => void; flush: () => Promise<void>; remove: (id: string) => Promise<void> } {
  const waiting = new Map<string, Typed>()
  let timer: number | undefined
  let writing: Promise<void> = Promise.resolve()

  function write(typed: Typed): void {
    waiting.set(typed.id, { ...typed, content: JSON.parse(JSON.stringify(typed.content)) as unknown })
    timer ??= window.setTimeout(() => void flush(), DELAY_MS)
  }

  function flush(): Promise<void> {
    window.clearTimeout(timer)
    timer = undefined
    const typed = [...waiting.values()]
    waiting.clear()
    if (typed.length > 0) writing = writing.then(() => putAll(typed))
    return writing
  }

  async function remove(id: string): Promise<void> {
    waiting.delete(id)
    await writing
    await device.drafts.delete(id)
  }

  window.addEventListener('pagehide', () => void flush())
  document.addEventListener('visibilitychange', () => { if (document.hidden) void flush() })
  return { write, flush, remove }
}

async function putAll(typed: Typed[]): Promise<void> {
  const at = now().toISOString()
  await device.transaction('rw', device.drafts, async () => {
    for (const one of typed) {
      const before = await device.drafts.get(one.id)
      await device.drafts.put({ ...one, begunAt: before?.begunAt ?? at, updatedAt: at })
    }
  })
}

/** The one writer of this page. */
export const draftWriter = createDraftWriter()
