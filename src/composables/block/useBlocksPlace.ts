import { computed, customRef, ref, type ComputedRef, type Ref } from 'vue'
import type { Block } from '../../../shared/contract/block.ts'
import type { Farm } from '../../../shared/contract/farm.ts'
import { totalAreaM2 } from '../../../shared/geo/totalAreaM2.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import type { Reader } from '../../../shared/messages/readFigure.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { readingUnit } from '../../../shared/units/readingUnit.ts'
import type { MapView } from '../map/mapTypes.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { areaText, blockWords, type BlockWords } from './blockWords.ts'
import { useBlocks } from './useBlocks.ts'
import { useFarm } from '../farm/useFarm.ts'

/** What all pages of Blocks share: the blocks in words, the ground, and where the map looked last. */
export interface BlocksPlace {
  farmId: ComputedRef<string>
  farm: ComputedRef<Farm | null>
  language: ComputedRef<Language>
  reader: ComputedRef<Reader>
  canManage: ComputedRef<boolean>
  canRecord: ComputedRef<boolean>
  query: ReturnType<typeof useBlocks>
  blocks: ComputedRef<readonly BlockWords[]>
  /** "24 blocks, 23.82 ha"; empty before the first. */
  count: ComputedRef<string>
  /** "23.82". */
  area: ComputedRef<string>
  /** Where a map that is opened now looks. */
  startAt: Readonly<Ref<MapView | null>>
  remember: (view: MapView) => void
  chosenId: Ref<string | null>
}

/** Where the map of each farm looked last, as long as this page lives. */
const lastViews = new Map<string, MapView>()
const FARM_ZOOM = 15

export function useBlocksPlace(): BlocksPlace {
  const session = useSession()
  const preferences = usePreferences()
  const farmId = computed(() => session.farmId)
  const language = computed(() => preferences.language)
  const query = useBlocks(farmId)
  const farm = useFarm(farmId)
  const all = computed<readonly Block[]>(() => query.data.value ?? [])
  const area = computed(() => areaText(preferences.reader, totalAreaM2(all.value)))

  function startView(): MapView | null {
    const last = lastViews.get(farmId.value)
    const place = farm.data.value?.place ?? null
    if (last !== undefined) return last
    return place !== null && query.data.value?.length === 0 ? { centre: place, zoom: FARM_ZOOM } : null
  }

  return {
    farmId, language, query, area,
    reader: computed(() => preferences.reader),
    farm: computed(() => farm.data.value ?? null),
    canManage: computed(() => session.canManage),
    canRecord: computed(() => session.canRecord),
    blocks: computed(() => all.value.map((block) => blockWords(preferences.reader, block))),
    count: computed(() => countWords(preferences.reader, all.value.length, area.value)),
    // Read anew by each map: where the last one looked is no news that anything should be drawn again for.
    startAt: customRef(() => ({ get: startView, set: () => undefined })),
    remember: (view) => { lastViews.set(farmId.value, view) },
    chosenId: ref<string | null>(null),
  }
}

function countWords(reader: Reader, count: number, area: string): string {
  if (count === 0) return ''
  return renderMessage(reader.language, { id: 'blocks.count', params: { count, area, areaUnit: readingUnit('ha', reader.units) } })
}
