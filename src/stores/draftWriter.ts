import { now } from '../plugins/clock.ts'
import { device } from '../plugins/device.ts'
import { openDraftChannel, type DraftChannel, type DraftWritten } from './draftChannel.ts'
import { draftCopies } from './draftCopies.ts'
import type { Draft } from './draftTypes.ts'

type Typed = Pick<Draft, 'id' | 'kind' | 'farmId' | 'accountId' | 'content'>
type Heard = (written: DraftWritten) => void

interface DraftWriter {
  /** Keeps it at once as a copy, and shortly after in the database. */
  write: (typed: Typed) => void
  /** Writes what still waits. */
  flush: () => Promise<void>
  /** Puts into the database what was typed last before a page was left. */
  recover: () => Promise<void>
  remove: (id: string) => Promise<void>
  /** Whether something typed here is not in the database yet. */
  isWaiting: (id: string) => boolean
  /** Notes the version of a draft found on the device: what is typed from now on is later, whatever the clock says. */
  saw: (found: DraftWritten) => void
  /** Calls back when the device has a version that was not typed in this tab; returns how to stop. */
  listen: (heard: Heard) => () => void
}

const DELAY_MS = 120

/**
 * Writes drafts to this device: a copy at each keystroke, the database shortly after and at once when the page is left.
 * The content is copied when it is handed over, so a form may go on changing it. Of two versions the one typed last stays.
 */
export function createDraftWriter(openChannel: () => DraftChannel = openDraftChannel): DraftWriter {
  const waiting = new Map<string, Draft>()
  /** The latest version known of each draft, and the latest typed here. */
  const versions = new Map<string, string>()
  const typedHere = new Map<string, string>()
  const listeners = new Set<Heard>()
  let timer: number | undefined
  let writing: Promise<void> = Promise.resolve()

  function write(typed: Typed): void {
    const before = waiting.get(typed.id) ?? draftCopies.of(typed.id)
    const updatedAt = laterThan(versions.get(typed.id) ?? before?.updatedAt)
    const draft = { ...typed, content: JSON.parse(JSON.stringify(typed.content)) as unknown, begunAt: before?.begunAt ?? updatedAt, updatedAt }
    versions.set(typed.id, updatedAt)
    typedHere.set(typed.id, updatedAt)
    draftCopies.put(draft)
    waiting.set(typed.id, draft)
    timer ??= window.setTimeout(() => void flush(), DELAY_MS)
  }

  function flush(): Promise<void> {
    window.clearTimeout(timer)
    timer = undefined
    const typed = [...waiting.values()]
    return typed.length > 0 ? queue(() => put(typed)) : writing
  }

  /** One after another; a write that failed holds up none after it. */
  function queue(work: () => Promise<void>): Promise<void> {
    writing = writing.catch(() => undefined).then(work)
    return writing
  }

  async function put(typed: Draft[]): Promise<void> {
    const kept = await putNewer(typed)
    for (const draft of typed) if (waiting.get(draft.id) === draft) waiting.delete(draft.id)
    for (const { id, updatedAt } of kept) draftCopies.drop(id, updatedAt)
    const isOurs = ({ id, updatedAt }: DraftWritten): boolean => typed.some((draft) => draft.id === id && draft.updatedAt === updatedAt)
    tell(kept.filter(isOurs))
    for (const other of kept.filter((one) => !isOurs(one))) for (const heard of listeners) heard(other)
  }

  function tell(written: DraftWritten[]): void {
    if (written.length === 0) return
    const channel = openChannel()
    for (const one of written) channel.postMessage(one)
    channel.close()
  }

  function recover(): Promise<void> {
    const copies = draftCopies.all()
    return copies.length > 0 ? queue(() => put(copies)) : writing.catch(() => undefined)
  }

  async function remove(id: string): Promise<void> {
    waiting.delete(id)
    draftCopies.drop(id)
    await queue(async () => {
      await device.drafts.delete(id)
    })
  }

  function saw({ id, updatedAt }: DraftWritten): void {
    if ((versions.get(id) ?? '') < updatedAt) versions.set(id, updatedAt)
  }

  function listen(heard: Heard): () => void {
    const channel = openChannel()
    listeners.add(heard)
    channel.onmessage = ({ data }: MessageEvent<DraftWritten>) => {
      // What this tab told comes back to it as well.
      if ((typedHere.get(data.id) ?? '') < data.updatedAt) heard(data)
    }
    return () => { listeners.delete(heard); channel.close() }
  }

  window.addEventListener('pagehide', () => void flush())
  document.addEventListener('visibilitychange', () => { if (document.hidden) void flush() })
  return { write, flush, recover, remove, isWaiting: (id) => waiting.has(id), saw, listen }
}

/** This moment, or just after `before` where the device's clock stands still or was put back. */
function laterThan(before: string | undefined): string {
  const at = now().getTime()
  return new Date(before === undefined ? at : Math.max(at, Date.parse(before) + 1)).toISOString()
}

/** Puts each draft unless the database has a newer one; gives what the database has then. */
function putNewer(typed: Draft[]): Promise<DraftWritten[]> {
  return Promise.all(typed.map(async (draft) => {
    const held = await device.drafts.change(draft.id, (before) => {
      const isNewer = before === undefined || before.updatedAt <= draft.updatedAt
      return isNewer ? { ...draft, begunAt: before?.begunAt ?? draft.begunAt } : undefined
    })
    return { id: draft.id, updatedAt: held?.updatedAt ?? draft.updatedAt }
  }))
}

/** The one writer of this page. */
export const draftWriter = createDraftWriter()
