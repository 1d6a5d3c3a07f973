import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { RECORD_STATES } from '../../../shared/contract/record.ts'
import { METHODS } from '../../../shared/contract/recordContent.ts'
import { REVIEWS } from '../../../shared/contract/register.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useMaterials } from '../input/useMaterials.ts'
import { usePeople } from '../people/usePeople.ts'

interface Option { value: string; label: string }
export type OptionName = 'season' | 'block' | 'method' | 'material' | 'person' | 'state' | 'review'

/** Seasons that can be chosen, counted back from this one: records are kept that long. */
const SEASONS = 10

/** What each part of the register's filter can be; a part that this reader may not ask by is not there. */
export function useRegisterOptions(): ComputedRef<Partial<Record<OptionName, Option[]>>> {
  const { t } = useI18n()
  const session = useSession()
  const farmId = computed(() => session.farmId)
  const { data: farm } = useFarm(farmId)
  const { data: blocks } = useBlocks(farmId)
  const { data: materials } = useMaterials(farmId)
  const { data: people } = usePeople(farmId)
  const seasons = computed(() => {
    const last = farm.value?.currentSeason
    return last === undefined ? [] : Array.from({ length: SEASONS }, (_, back) => ({ value: String(last - back), label: String(last - back) }))
  })
  return computed(() => ({
    season: seasons.value,
    block: (blocks.value ?? []).map(({ id, code, name }) => ({ value: id, label: code, note: name })),
    method: METHODS.map((method) => ({ value: method, label: t(`frame.method.${method}`) })),
    material: (materials.value ?? []).map(({ id, name }) => ({ value: id, label: name })),
    ...(session.isOfFarm && {
      person: (people.value ?? []).map(({ id, name }) => ({ value: id, label: name })),
      state: RECORD_STATES.map((state) => ({ value: state, label: t(`register.filter.states.${state}`) })),
      review: REVIEWS.map((review) => ({ value: review, label: t(`register.filter.reviews.${review}`) })),
    }),
  }))
}
