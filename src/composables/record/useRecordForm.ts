import { onScopeDispose, ref, shallowRef, watch, type Ref } from 'vue'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { ApiError, NetworkError } from '../../api/errors.ts'
import { recordApi } from '../../api/recordApi.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'
import { now } from '../../plugins/clock.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { isNotFound } from '../app/isNotFound.ts'
import { emptyLine } from './lineDraft.ts'
import { readKeptDraft } from './readKeptDraft.ts'
import { contentOf } from './recordContent.ts'
import { saysNoMore } from './saysNoMore.ts'
import { draftLike, draftOfRecord, emptyRecord, type RecordDraft } from './recordDraft.ts'
import type { Draft } from '../../stores/draftTypes.ts'
import { useDrafts } from '../form/useDrafts.ts'
import type { RecordStock } from './useRecordStock.ts'

/** On the device: the record as far as it is written, for the lists, and the form as it was typed. */
interface KeptContent {
  /** Of whichever version of the program wrote it. */
  typed: unknown
}

interface RecordFormOptions {
  /** Id of the record, made when the form was opened. */
  id: string
  /** True for an id made this moment: nothing can be kept under it yet. */
  fresh: boolean
  /** A record whose mix is taken over; empty for none. */
  likeId: string
  /** Blocks that a new record starts with. */
  blockIds: readonly string[]
  /** Jobs of season plans that a fresh form is filled in from. */
  jobIds: readonly string[]
  stock: Ref<RecordStock>
  stockReady: Ref<boolean>
}

export interface RecordForm {
  draft: Ref<RecordDraft>
  /**
   * `signed`: somebody signed it already, it is only to be read. `notHere`: neither this device nor the farm has it.
   * `unread`: this device has not got it, and the farm could not be asked.
   */
  state: Ref<'loading' | 'ready' | 'signed' | 'notHere' | 'unread'>
  /** The record as it was signed meanwhile, where what is typed here says something else; else null. */
  overtakenBy: Ref<ApplicationRecord | null>
  /** Looks for it once more. */
  lookAgain: () => Promise<void>
  /** When the draft was begun on this device; null before the first keystroke. */
  begunAt: Ref<string | null>
  flush: () => Promise<void>
  /** Takes the draft off the device: it is signed. */
  discard: () => Promise<void>
}

/** An empty form on the blocks it was opened for; the only sprayer of a farm is chosen already. */
function firstDraft({ sprayers, blocks }: RecordStock, blockIds: readonly string[], units: UnitSystem): RecordDraft {
  const [only, ...others] = sprayers
  const lines = blockIds.filter((wanted) => blocks.some(({ id }) => id === wanted)).map(emptyLine)
  return { ...emptyRecord(units), lines, sprayerId: only !== undefined && others.length === 0 ? only.id : '' }
}

const isOpen = ({ state }: ApplicationRecord): boolean => state === 'started' || state === 'draft'

/** The form of a record: found on the device, else at the server, else empty; kept at every keystroke. */
export function useRecordForm({ id, fresh, likeId, blockIds, jobIds, stock, stockReady }: RecordFormOptions): RecordForm {
  const drafts = useDrafts(() => stock.value.farmId, 'record')
  const preferences = usePreferences()
  const draft = ref<RecordDraft>(emptyRecord())
  const state: RecordForm['state'] = ref('loading')
  const overtakenBy = shallowRef<ApplicationRecord | null>(null)
  const begunAt = shallowRef<string | null>(null)
  let stopKeeping: (() => void) | null = null
  /** The form as the device has it: what another tab typed is not written back. */
  let keptText = ''
  let isDiscarded = false

  async function find(): Promise<RecordDraft | 'signed' | 'notHere' | 'unread'> {
    const kept = await drafts.read<KeptContent>(id)
    if (kept) {
      begunAt.value = kept.begunAt
      return readKeptDraft(kept.content.typed)
    }
    if (fresh && likeId === '') return (await findJobs()) ?? firstDraft(stock.value, blockIds, preferences.units)
    return (await findAtServer()) ?? firstDraft(stock.value, blockIds, preferences.units)
  }

  /** The form as the jobs fill it in that it was opened from; null without any, or where no plan has them any more. */
  async function findJobs(): Promise<RecordDraft | null> {
    if (jobIds.length === 0) return null
    const { readJobDraft } = await import('./readJobDraft.ts')
    return readJobDraft(stock.value, jobIds)
  }

  /** The record where the server says that it is open no more; without an answer the draft stays as it is. */
  async function findClosed({ revision }: RecordDraft): Promise<ApplicationRecord | null> {
    if (revision === null) return null
    try {
      const record = await recordApi.read(stock.value.farmId, id)
      return isOpen(record) ? null : record
    } catch (error) {
      if (error instanceof NetworkError || error instanceof ApiError) return null
      throw error
    }
  }

  async function findAtServer(): Promise<RecordDraft | 'signed' | 'notHere' | 'unread' | null> {
    const { farmId } = stock.value
    try {
      if (fresh) return draftLike(await recordApi.read(farmId, likeId), preferences.units)
      const record = await recordApi.read(farmId, id)
      return isOpen(record) ? draftOf(record) : 'signed'
    } catch (error) {
      if (isNotFound(error)) return fresh ? null : 'notHere'
      if (error instanceof NetworkError || error instanceof ApiError) return 'unread'
      throw error
    }
  }

  const zone = (): string => stock.value.farm?.zone ?? 'UTC'
  const draftOf = (record: ApplicationRecord): RecordDraft => draftOfRecord(record, zone(), preferences.units)
  const saidBy = (typed: RecordDraft): unknown => contentOf(typed, { zone: zone(), happened: true })

  function keep(): void {
    const typed = draft.value
    const text = JSON.stringify(typed)
    if (text === keptText) return
    keptText = text
    drafts.write(id, 'record', { ...contentOf(typed, { zone: zone(), happened: true }), typed })
    begunAt.value ??= now().toISOString()
  }

  async function load(): Promise<void> {
    const found = await find()
    if (typeof found === 'string') { state.value = found; return }
    show(found)
    state.value = 'ready'
    stopKeeping = watch(draft, keep, { deep: true })
    if (begunAt.value !== null) await leaveSigned()
  }

  /**
   * A weak signal does not hold up the form: it is open already, and is left when the answer says that the record is signed. What was
   * typed here and is not in the record stays until somebody has seen it.
   */
  async function leaveSigned(): Promise<void> {
    const closed = await findClosed(draft.value)
    if (closed === null || isDiscarded) return
    if (!saysNoMore(saidBy(draft.value), saidBy(draftOf(closed)))) { overtakenBy.value = closed; return }
    await discard()
    state.value = 'signed'
  }

  async function discard(): Promise<void> {
    stopKeeping?.()
    isDiscarded = true
    await drafts.remove(id)
  }

  function show(found: RecordDraft): void {
    keptText = JSON.stringify(found)
    draft.value = found
  }

  /** Another tab has typed in the same draft: its words are shown here at once. */
  function takeOver({ content, begunAt: begun }: Draft<KeptContent>): void {
    const typed = readKeptDraft(content.typed)
    if (isDiscarded || state.value !== 'ready' || JSON.stringify(typed) === keptText) return
    begunAt.value = begun
    show(typed)
  }

  drafts.onTakenOver<KeptContent>(id, takeOver)
  const stopWaiting = watch(stockReady, (ready) => { if (ready && state.value === 'loading') void load() }, { immediate: true })
  onScopeDispose(stopWaiting)

  return {
    draft, state, begunAt, overtakenBy,
    lookAgain: () => { state.value = 'loading'; return load() },
    flush: () => drafts.flush(),
    discard,
  }
}
