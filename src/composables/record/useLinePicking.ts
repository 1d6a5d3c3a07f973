import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { emptyLine } from './lineDraft.ts'
import type { RecordDraft } from './recordDraft.ts'

/** Choosing blocks for a record: several at once, and a second part of one. */
export function useLinePicking(draft: Ref<RecordDraft>): {
  picking: Ref<boolean>
  taken: ComputedRef<ReadonlySet<string>>
  pick: (blockIds: readonly string[]) => void
  /** Adds another line on the block of that one, for rows that were left between. */
  another: (key: string) => void
} {
  const picking = ref(false)
  const dayOfWork = (): string => draft.value.lines.find(({ start }) => start.date !== '')?.start.date ?? ''
  const lineOn = (blockId: string): RecordDraft['lines'][number] => {
    const line = emptyLine(blockId)
    return { ...line, start: { ...line.start, date: dayOfWork() } }
  }

  return {
    picking,
    taken: computed(() => new Set(draft.value.lines.map(({ blockId }) => blockId))),
    pick: (blockIds) => {
      draft.value.lines.push(...blockIds.map(lineOn))
      picking.value = false
    },
    another: (key) => {
      const at = draft.value.lines.findIndex((line) => line.key === key)
      const line = draft.value.lines[at]
      if (!line) return
      const beside = lineOn(line.blockId)
      const kind = line.part.kind === 'whole' ? 'rows' : line.part.kind
      if (line.part.kind === 'whole') line.part.kind = 'rows'
      draft.value.lines.splice(at + 1, 0, { ...beside, part: { ...beside.part, kind, of: line.part.of } })
    },
  }
}
