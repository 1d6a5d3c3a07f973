import { onScopeDispose, ref, shallowRef, watch, type Ref } from 'vue'
import { recordSheet } from '../../shared/mix/recordSheet.ts'
import { NetworkError } from '../api/errors.ts'
import { recordApi } from '../api/recordApi.ts'
import { now } from '../plugins/clock.ts'
import { isNotFound } from './isNotFound.ts'
import { contentOf, sheetInputOf } from './recordContent.ts'
import { draftLike, draftOfRecord, emptyRecord, type RecordDraft } from './recordDraft.ts'
import { useDrafts } from './useDrafts.ts'
import type { RecordStock } from './useRecordStock.ts'

/** On the device: the record as far as it is written, for the lists, and the form as it was typed. */
interface KeptContent {
  typed: RecordDraft
}

interface RecordFormOptions {
  /** Id of the record, made when the form was opened. */
  id: string
  /** True for an id made this moment: nothing can be kept under it yet. */
  fresh: boolean
  /** A record whose mix is taken over; empty for none. */
  likeId: string
  stock: Ref<RecordStock>
  stockReady: Ref<boolean>
}

export interface RecordForm {
  draft: Ref<RecordDraft>
  /** `signed`: somebody signed it already, it is only to be read. */
  state: Ref<'loading' | 'ready' | 'signed'>
  /** When the draft was begun on this device; null before the first keystroke. */
  begunAt: Ref<string | null>
  flush: () => Promise<void>
  /** Takes the draft off the device: it is signed. */
  discard: () => Promise<void>
}

/** An empty form; the only sprayer of a farm is chosen already. */
function firstDraft({ sprayers }: RecordStock): RecordDraft {
  const [only, ...others] = sprayers
  return { ...emptyRecord(), sprayerId: only !== undefined && others.length === 0 ? only.id : '' }
}

/** The form of a record: found on the device, else at the server, else empty; kept at every keystroke. */
export function useRecordForm({ id, fresh, likeId, stock, stockReady }: RecordFormOptions): RecordForm {
  const drafts = useDrafts(() => stock.value.farmId, 'record')
  const draft = ref<RecordDraft>(emptyRecord())
  const state = ref<'loading' | 'ready' | 'signed'>('loading')
  const begunAt = shallowRef<string | null>(null)
  let stopKeeping: (() => void) | null = null

  async function find(): Promise<RecordDraft | 'signed'> {
    const kept = await drafts.read<KeptContent>(id)
    if (kept) {
      begunAt.value = kept.begunAt
      return { ...emptyRecord(), ...kept.content.typed }
    }
    if (fresh && likeId === '') return firstDraft(stock.value)
    return (await findAtServer()) ?? firstDraft(stock.value)
  }

  async function findAtServer(): Promise<RecordDraft | 'signed' | null> {
    const { farmId, farm } = stock.value
    try {
      if (fresh) return draftLike(await recordApi.read(farmId, likeId))
      const record = await recordApi.read(farmId, id)
      return record.state === 'started' || record.state === 'draft' ? draftOfRecord(record, farm?.zone ?? 'UTC') : 'signed'
    } catch (error) {
      if (error instanceof NetworkError || isNotFound(error)) return null
      throw error
    }
  }

  function keep(): void {
    const { farm, blocks, sprayers } = stock.value
    const typed = draft.value
    const sheet = recordSheet(sheetInputOf(typed, {
      areaM2: blocks.find((block) => block.id === typed.blockId)?.areaM2 ?? null,
      tankL: sprayers.find((sprayer) => sprayer.id === typed.sprayerId)?.tankL ?? null,
    }))
    drafts.write(id, 'record', { ...contentOf(typed, { zone: farm?.zone ?? 'UTC', sheet, happened: true }), typed })
    begunAt.value ??= now().toISOString()
  }

  async function load(): Promise<void> {
    const found = await find()
    if (found === 'signed') { state.value = 'signed'; return }
    draft.value = found
    state.value = 'ready'
    stopKeeping = watch(draft, keep, { deep: true })
  }

  const stopWaiting = watch(stockReady, (ready) => { if (ready && state.value === 'loading') void load() }, { immediate: true })
  onScopeDispose(stopWaiting)

  return {
    draft, state, begunAt,
    flush: () => drafts.flush(),
    discard: async () => { stopKeeping?.(); await drafts.remove(id) },
  }
}
