import { computed, type ComputedRef } from 'vue'
import type { Boundary } from '../../../shared/contract/block.ts'
import type { RegisterRow } from '../../../shared/contract/record.ts'
import { presentDraft } from '../../../shared/register/presentDraft.ts'
import { presentRow, type RegisterPlace } from '../../../shared/register/presentRow.ts'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useDrafts } from '../form/useDrafts.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useLots } from '../input/useLots.ts'
import { useMaterials } from '../input/useMaterials.ts'
import { useSprayers } from '../farm/useSprayers.ts'

export interface RegisterWords {
  /** The farm's zone and season with the reader's language; null until the farm is read. */
  place: ComputedRef<RegisterPlace | null>
  /** Drafts of this device and account, newest first, as pencil lines. */
  draftLines: ComputedRef<RegisterLine[]>
  present: (rows: readonly RegisterRow[]) => RegisterLine[]
  /** Outlines of the blocks by id. */
  outlines: ComputedRef<ReadonlyMap<string, Boundary>>
}

/** Drafts that the server has not got yet: those it has are among its rows. */
export function unsentDrafts(drafts: readonly RegisterLine[], rows: readonly Pick<RegisterRow, 'id'>[]): RegisterLine[] {
  const known = new Set(rows.map(({ id }) => id))
  return drafts.filter(({ id }) => !known.has(id))
}

/** Rows of the register and drafts of this device as lines in the reader's language and the farm's time. */
export function useRegisterLines(): RegisterWords {
  const session = useSession()
  const preferences = usePreferences()
  const farmId = computed(() => session.farmId)
  const { data: farm } = useFarm(farmId)
  const { data: blocks } = useBlocks(farmId)
  const { data: materials } = useMaterials(farmId)
  const { data: lots } = useLots(farmId)
  const { data: sprayers } = useSprayers(farmId)
  const { drafts } = useDrafts(farmId, 'record')

  const place = computed(() =>
    farm.value === undefined
      ? null
      : { ...preferences.reader, zone: farm.value.zone, season: farm.value.currentSeason },
  )
  const stock = computed(() => ({
    blocks: blocks.value ?? [], materials: materials.value ?? [], lots: lots.value ?? [], sprayers: sprayers.value ?? [],
  }))
  const draftLines = computed(() => {
    const at = place.value
    if (at === null) return []
    const by = session.user?.name ?? ''
    return drafts.value.map(({ id, content, begunAt }) => presentDraft({ id, content, begunAt, by }, stock.value, at))
  })

  return {
    place,
    draftLines,
    present: (rows) => {
      const at = place.value
      return at === null ? [] : rows.map((row) => presentRow(row, at))
    },
    outlines: computed(() => new Map(stock.value.blocks.map(({ id, geometry }) => [id, geometry]))),
  }
}
