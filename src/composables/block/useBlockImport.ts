import { computed, ref, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import type { BlocksImported } from '../../../shared/contract/blockImport.ts'
import type { Message } from '../../../shared/contract/common.ts'
import { guessColumns } from '../../../shared/importing/guessColumns.ts'
import { IMPORT_LIMITS, type Candidate, type ImportOptions, type ReadFile } from '../../../shared/importing/importTypes.ts'
import { ApiError } from '../../api/errors.ts'
import type { Submitted } from '../../stores/outbox.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { countRows, faultOfAll, importRows, type ImportCount, type ImportEdit, type ImportRow } from './importRows.ts'
import { newId } from '../form/newId.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { ImportRefusal, useImportWorker } from './useImportWorker.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

const PLAIN: ImportOptions = { swap: false, close: false, toleranceM: 0, nameColumn: null, codeColumn: null, cropColumn: null }

/** A file of blocks on its way in: what was read, how it is taken, and sending it. */
export interface BlockImport {
  fileName: Ref<string>
  file: ShallowRef<ReadFile | null>
  /** True while it is read or judged. */
  busy: ComputedRef<boolean>
  /** Why the file cannot be read. */
  fault: ShallowRef<Message | null>
  options: Ref<ImportOptions>
  rows: ComputedRef<ImportRow[]>
  count: ComputedRef<ImportCount>
  edit: (number: number, change: ImportEdit) => void
  takeAll: () => void
  /** Whether a ticked one is unlikely and waits for a reason. */
  asksReason: ComputedRef<boolean>
  reason: Ref<string>
  /** What is missing before it can be sent, as a message. */
  missing: ShallowRef<Message | null>
  /** The server's words by number of the shape. */
  refused: ShallowRef<ReadonlyMap<number, string>>
  open: (chosen: File) => Promise<void>
  save: () => Promise<Submitted<BlocksImported> | undefined>
  saving: Ref<boolean>
  error: ShallowRef<unknown>
}

export function useBlockImport(place: BlocksPlace): BlockImport {
  const worker = useImportWorker()
  const { submit } = useSubmit()
  const fileName = ref('')
  const file = shallowRef<ReadFile | null>(null)
  const fault = shallowRef<Message | null>(null)
  const options = ref<ImportOptions>({ ...PLAIN })
  const candidates = shallowRef<readonly Candidate[]>([])
  const edits = shallowRef<ReadonlyMap<number, ImportEdit>>(new Map())
  const reason = ref('')
  const missing = shallowRef<Message | null>(null)
  const refused = shallowRef<ReadonlyMap<number, string>>(new Map())
  const ids = new Map<number, string>()

  const rows = computed(() => importRows(candidates.value, edits.value, place.blocks.value.map(({ code }) => code)))
  const count = computed(() => countRows(rows.value))
  const asksReason = computed(() => rows.value.some(({ taken, cautions }) => taken && cautions.length > 0))

  const opening = useTask(async (chosen: File): Promise<void> => {
    forget()
    fileName.value = chosen.name
    await orFault(async () => {
      const read = await worker.read(new Uint8Array(await chosen.arrayBuffer()))
      options.value = { ...PLAIN, ...guessColumns(read) }
      file.value = read
      await judge()
    })
  })

  const judging = useTask(async (): Promise<void> => { await orFault(judge) })

  async function judge(): Promise<void> {
    const blocks = place.blocks.value.map(({ id, code, name, geometry }) => ({ id, code, name, geometry }))
    candidates.value = await worker.judge({ ...options.value }, withoutWrappers({ blocks, place: place.farm.value?.place ?? null }))
  }
  watch(options, () => { if (file.value !== null && !opening.running.value) void judging.run() }, { deep: true })

  async function orFault(work: () => Promise<void>): Promise<void> {
    try {
      await work()
    } catch (error) {
      if (!(error instanceof ImportRefusal)) throw error
      forget()
      fault.value = error.words
    }
  }

  function forget(): void {
    file.value = null
    fault.value = null
    candidates.value = []
    edits.value = new Map()
    missing.value = null
    refused.value = new Map()
    ids.clear()
  }

  function edit(number: number, change: ImportEdit): void {
    edits.value = new Map([...edits.value, [number, { ...edits.value.get(number), ...change }]])
    missing.value = null
  }

  function takeAll(): void {
    const whole = rows.value.filter(({ geometry, twin }) => geometry !== null && twin === null)
    edits.value = new Map([...edits.value, ...whole.map(({ number }) => [number, { ...edits.value.get(number), taken: true }] as const)])
  }

  function bodies() {
    return rows.value.flatMap(({ number, taken, code, name, crop, geometry, cautions }) => {
      if (!taken || geometry === null) return []
      const id = ids.get(number) ?? newId()
      ids.set(number, id)
      const acknowledged = [...new Set(cautions.map((caution) => caution.code))].map((each) => ({ code: each, reason: reason.value }))
      return [{ number, body: { id, code, name, crop: crop === '' ? null : crop, geometry: { ...geometry }, acknowledged } }]
    })
  }

  const sending = useTask(async (): Promise<Submitted<BlocksImported> | undefined> => {
    const sent = bodies()
    const blocks = sent.map(({ body }) => body)
    missing.value = missingOf(blocks)
    refused.value = new Map()
    if (missing.value !== null) return undefined
    try {
      return await submit({ kind: 'block.import', farmId: place.farmId.value, id: place.farmId.value, body: { blocks } })
    } catch (error) {
      if (error instanceof ApiError) refused.value = refusedRows(error, sent.map(({ number }) => number))
      throw error
    }
  })

  function missingOf(blocks: readonly unknown[]): Message | null {
    const all = faultOfAll(count.value, new TextEncoder().encode(JSON.stringify(blocks)).length)
    if (all !== null) return { id: `importing.error.${all}`, params: { ticked: count.value.taken, most: IMPORT_LIMITS.blocks } }
    const bad = rows.value.find(({ codeError, nameError }) => codeError !== null || nameError !== null)
    if (bad !== undefined) return { id: 'importing.error.row', params: { number: bad.number } }
    return asksReason.value && reason.value.trim() === '' ? { id: 'blocks.unlikely.reasonNeeded', params: {} } : null
  }

  return {
    fileName, file, fault, options, rows, count, edit, takeAll, asksReason, reason, missing, refused,
    busy: computed(() => opening.running.value || judging.running.value),
    open: async (chosen) => { await opening.run(chosen) },
    save: sending.run, saving: sending.running, error: sending.error,
  }
}

/** Without the page's own wrappers, which no worker takes. */
function withoutWrappers<Thing>(thing: Thing): Thing {
  return JSON.parse(JSON.stringify(thing)) as Thing
}

/** What the server refused, by the number of the shape: paths name the place among those sent. */
function refusedRows(error: ApiError, numbers: readonly number[]): ReadonlyMap<number, string> {
  const found = new Map<number, string>()
  for (const [path, words] of Object.entries(fieldErrors(error))) {
    const place = /^blocks\.(\d+)\./.exec(path)?.[1]
    const number = place === undefined ? undefined : numbers[Number(place)]
    if (number !== undefined) found.set(number, words)
  }
  return found
}
