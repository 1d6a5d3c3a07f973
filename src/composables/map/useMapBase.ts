import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { readSetting, writeSetting } from '../../stores/settings.ts'
import type { MapImagery } from './mapTypes.ts'
import { useConfig } from '../app/useConfig.ts'

/** What lies under the blocks: the farm's own ground plan, or the imagery that this server offers. */
export type Base = 'plan' | 'imagery'
export interface MapBase {
  /** The imagery that may be chosen, with whose it is; null where none is set up. */
  offered: ComputedRef<{ attribution: string; maxZoom: number } | null>
  choice: Ref<Base>
  /** Chosen on one map, chosen on all of this device. */
  choose: (base: Base) => void
  /** The imagery to be shown now. */
  shown: ComputedRef<MapImagery | null>
}

const SETTING = 'map.base'
const choice = ref<Base>(readSetting(SETTING, ['plan', 'imagery']) ?? 'plan')

export function useMapBase(): MapBase {
  const config = useConfig()
  const offered = computed(() => config.data.value?.imagery ?? null)
  return {
    offered, choice,
    choose: (base) => {
      choice.value = base
      writeSetting(SETTING, base)
    },
    shown: computed(() => (offered.value === null || choice.value === 'plan' ? null : { url: '/api/tiles/{z}/{x}/{y}', maxZoom: offered.value.maxZoom })),
  }
}
