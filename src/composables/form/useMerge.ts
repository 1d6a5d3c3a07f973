import { computed, ref, type ComputedRef, type Ref } from 'vue'
import type { z } from 'zod'
import { ApiError } from '../../api/errors.ts'

/** A field that two people changed, each in another way. */
export interface Clash<Draft> {
  field: keyof Draft & string
  mine: unknown
  theirs: unknown
}

/** A form over something that another may change meanwhile: what both wrote is put together, and only what clashes is asked. */
export interface Merge<Draft> {
  /** The revision that is written over: theirs, once it was met. */
  revision: Ref<number>
  /** Something has to be chosen before anything is sent. */
  isHeld: ComputedRef<boolean>
  /** What is to be chosen. */
  clashes: Ref<Clash<Draft>[]>
  /** Fields that only the other changed: they stand in the form as the other wrote them. */
  taken: Ref<(keyof Draft & string)[]>
  /** Puts the other's side of a refused write into the form; false where it was refused for something else. */
  meet: (error: unknown) => boolean
  choose: (field: keyof Draft & string, side: 'mine' | 'theirs') => void
}

interface Merging<Thing, Draft> {
  draft: Ref<Draft>
  /** As it was when the form opened. */
  opened: Thing
  schema: z.ZodType<Thing>
  draftOf: (thing: Thing) => Draft
}

const isSame = (one: unknown, other: unknown): boolean => JSON.stringify(one) === JSON.stringify(other)

export function useMerge<Thing extends { revision: number }, Draft extends object>({ draft, opened, schema, draftOf }: Merging<Thing, Draft>): Merge<Draft> {
  const revision = ref(opened.revision)
  const clashes = ref<Clash<Draft>[]>([]) as Ref<Clash<Draft>[]>
  const taken = ref<(keyof Draft & string)[]>([]) as Ref<(keyof Draft & string)[]>
  let before = draftOf(opened)

  function meet(error: unknown): boolean {
    if (!(error instanceof ApiError) || error.problem.code !== 'stale') return false
    const read = schema.safeParse(error.problem.current)
    if (!read.success) return false
    const theirs = draftOf(read.data)
    const fields = (Object.keys(theirs) as (keyof Draft & string)[]).filter((field) => !isSame(theirs[field], before[field]))
    taken.value = fields.filter((field) => isSame(draft.value[field], before[field]))
    for (const field of taken.value) draft.value[field] = theirs[field]
    clashes.value = fields.filter((field) => !isSame(draft.value[field], theirs[field])).map((field) => ({ field, mine: draft.value[field], theirs: theirs[field] }))
    before = theirs
    revision.value = read.data.revision
    return true
  }

  function choose(field: keyof Draft & string, side: 'mine' | 'theirs'): void {
    const clash = clashes.value.find((each) => each.field === field)
    if (clash === undefined) return
    draft.value[field] = clash[side] as Draft[typeof field]
    clashes.value = clashes.value.filter((each) => each !== clash)
  }

  return { revision, clashes, taken, meet, choose, isHeld: computed(() => clashes.value.length > 0) }
}
