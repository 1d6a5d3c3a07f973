import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { blockApi } from '../../api/blockApi.ts'
import type { BlockWords } from './blockWords.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

interface Named { id: string; code: string }

/** Where a block came from and what came of it. */
export interface BlockOrigin {
  /** What ended it, in a sentence; empty while it stands. */
  ended: ComputedRef<string>
  from: ComputedRef<Named[]>
  into: ComputedRef<Named[]>
}

/** Reads the blocks that have ended only where one is spoken of. */
export function useBlockOrigin(block: () => BlockWords | null, { farmId, language }: BlocksPlace): BlockOrigin {
  const { t } = useI18n()
  const related = computed(() => [...(block()?.fromIds ?? []), ...(block()?.intoIds ?? [])])
  const all = useFarmRead('blocks-ended', farmId, (id) => blockApi.listAll(id), () => related.value.length > 0)
  const named = (ids: readonly string[]): Named[] => ids.flatMap((id) => (all.data.value ?? []).filter((each) => each.id === id).map(({ code }) => ({ id, code })))
  return {
    ended: computed(() => {
      const each = block()
      if (each === null || each.endedOn === null || each.endedBy === null) return ''
      return t(`growing.ended.${each.endedBy}`, { code: each.code, day: formatDay(language.value, each.endedOn) })
    }),
    from: computed(() => named(block()?.fromIds ?? [])),
    into: computed(() => named(block()?.intoIds ?? [])),
  }
}
