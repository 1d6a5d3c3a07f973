import { defineStore } from 'pinia'
import { computed, ref, shallowRef, watch } from 'vue'
import type { Attachment } from '../../shared/contract/attachment.ts'
import { ApiError, NetworkError } from '../api/errors.ts'
import { fileApi, type FileToSend } from '../api/fileApi.ts'
import { now } from '../plugins/clock.ts'
import { device } from '../plugins/device.ts'
import { queryClient } from '../plugins/queryClient.ts'
import type { KeptFile } from './keptFile.ts'
import { mustWait, useOutbox } from './outbox.ts'
import { useSession } from './session.ts'

const RETRY_MS = 30_000

/** What became of one file: gone to the server, waiting, or refused. */
type Outcome = 'sent' | 'waits' | 'refused' | 'noSignal'

/**
 * Photos and papers on their way: on this device before they are sent, and off it when the server has them. A file goes after the
 * record it belongs to.
 */
export const useFileQueue = defineStore('fileQueue', () => {
  const session = useSession()
  const outbox = useOutbox()
  const items = shallowRef<KeptFile[]>([])
  /** Share that has gone, by the id of what is being sent. */
  const progress = ref<Record<string, number>>({})
  /** Files that this device has no room for: they live as long as the page. */
  const unkept = new Map<string, KeptFile>()
  let flushing: Promise<void> | null = null

  const mine = computed(() => items.value.filter((item) => item.accountId === session.user?.id))
  const kept = computed(() => mine.value.filter(({ state }) => state === 'kept'))
  const needsYou = computed(() => mine.value.filter(({ state }) => state === 'needsYou'))

  const sendingCount = computed(() => Object.keys(progress.value).length)

  async function refresh(): Promise<void> {
    const found = await device.files.all().catch(() => [])
    found.sort((one, other) => one.keptAt.localeCompare(other.keptAt))
    items.value = [...found, ...unkept.values()]
  }

  async function write(item: KeptFile): Promise<void> {
    if (unkept.has(item.id)) unkept.set(item.id, item)
    else await device.files.put(item).catch(() => { unkept.set(item.id, item) })
    await refresh()
  }

  /** Takes it off this device: it is sent, or a person said so. */
  async function discard(id: string): Promise<void> {
    unkept.delete(id)
    await device.files.delete(id).catch(() => undefined)
    await refresh()
  }

  /** Keeps files on this device and begins to send them. @param recordSeen whether the server has their record. @returns whether this device has room for all of them. */
  async function add(files: FileToSend[], recordSeen: boolean): Promise<boolean> {
    for (const file of files) {
      await write({ ...file, accountId: session.user?.id ?? '', keptAt: now().toISOString(), state: 'kept', problem: null, recordSeen })
    }
    void flush()
    return files.every(({ id }) => !unkept.has(id))
  }

  /** Sends what is kept and whose record is there, oldest first; stops at the first that finds no signal. */
  function flush(): Promise<void> {
    flushing ??= sendKept().finally(() => { flushing = null })
    return flushing
  }

  async function sendKept(): Promise<void> {
    await refresh()
    const tried = new Set<string>()
    for (let next = nextOf(tried); next !== undefined; next = nextOf(tried)) {
      tried.add(next.id)
      if ((await send(next)) === 'noSignal') return
    }
  }

  const nextOf = (tried: Set<string>): KeptFile | undefined => kept.value.find(({ id, recordSeen }) => recordSeen && !tried.has(id))

  async function send(item: KeptFile): Promise<Outcome> {
    progress.value = { ...progress.value, [item.id]: 0 }
    try {
      const answer = await fileApi.add(item, (share) => { progress.value = { ...progress.value, [item.id]: share } })
      // Taken back while it was going.
      if (!items.value.some(({ id }) => id === item.id)) await fileApi.remove(item.farmId, item.id)
      else show(item, answer)
      await discard(item.id)
      return 'sent'
    } catch (error) {
      return await settle(item, error)
    } finally {
      const { [item.id]: _gone, ...others } = progress.value
      progress.value = others
    }
  }

  /** The server has this record now: what belongs to it may go. */
  async function sawRecord(recordId: string): Promise<void> {
    for (const item of mine.value.filter((each) => each.recordId === recordId && !each.recordSeen)) await write({ ...item, recordSeen: true })
  }

  /** After a start nobody knows which records arrived since: each is asked for once. */
  async function askForRecords(): Promise<void> {
    await refresh()
    for (const item of kept.value.filter(({ recordSeen }) => !recordSeen)) {
      try {
        await fileApi.list(item.farmId, item.recordId)
        await sawRecord(item.recordId)
      } catch (error) {
        if (error instanceof NetworkError) return
        if (!(error instanceof ApiError)) throw error
        if (error.problem.status === 404) await dropOrphan(item)
      }
    }
  }

  /** Its record is still to come; or a person dropped it, and this goes with it. */
  async function dropOrphan({ id, recordId }: KeptFile): Promise<void> {
    const isComing = outbox.items.some(({ command }) => command.id === recordId) || (await device.drafts.get(recordId)) !== undefined
    if (!isComing) await discard(id)
  }

  async function settle(item: KeptFile, error: unknown): Promise<Outcome> {
    if (error instanceof NetworkError) return 'noSignal'
    if (!(error instanceof ApiError)) throw error
    const waits = mustWait(error)
    await write({ ...item, state: waits ? 'kept' : 'needsYou', problem: error.problem })
    return waits ? 'waits' : 'refused'
  }

  /** The list has it at once, and is read anew in the background. */
  function show({ farmId, recordId }: KeptFile, answer: Attachment): void {
    const queryKey = ['files', farmId, recordId]
    queryClient.setQueryData<Attachment[]>(queryKey, (list) => list && [...list.filter(({ id }) => id !== answer.id), answer])
    void queryClient.invalidateQueries({ queryKey })
  }

  /** Sends what belongs to a record that the server has. @returns how many of them are left. */
  async function sendOf(recordId: string): Promise<number> {
    await sawRecord(recordId)
    await flush()
    // One that joined while the rest went is taken now.
    await flush()
    return mine.value.filter((item) => item.recordId === recordId).length
  }

  /** Puts a refused file back in line. */
  async function retry(id: string): Promise<void> {
    const item = items.value.find((each) => each.id === id)
    if (item !== undefined) await write({ ...item, state: 'kept', problem: null })
    await flush()
  }

  /** Begins to watch for signal and for records that arrive; call once, when the app starts. */
  function start(): void {
    const attempt = (): void => { if (kept.value.length > 0) void flush() }
    window.addEventListener('online', attempt)
    window.addEventListener('focus', attempt)
    window.setInterval(attempt, RETRY_MS)
    watch(() => outbox.lastSent, (sent) => { if (sent?.kind === 'record.create') void sawRecord(sent.id).then(attempt) }, { flush: 'sync' })
    void askForRecords().then(attempt)
  }

  return { items: mine, kept, needsYou, progress, sendingCount, add, flush, sendOf, retry, discard, start }
})
