import { computed, type ComputedRef } from 'vue'
import type { Block } from '../../../shared/contract/block.ts'
import type { Farm, Sprayer } from '../../../shared/contract/farm.ts'
import type { Person } from '../../../shared/contract/person.ts'
import type { Lot, Material } from '../../../shared/contract/input.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useFarm } from '../farm/useFarm.ts'
import { useLots } from '../input/useLots.ts'
import { useMaterials } from '../input/useMaterials.ts'
import { usePeople } from '../people/usePeople.ts'
import { useSprayers } from '../farm/useSprayers.ts'

/** What a farm has, for a record to point at; empty lists while they are read. */
export interface RecordStock {
  farmId: string
  farm: Farm | null
  blocks: readonly Block[]
  materials: readonly Material[]
  lots: readonly Lot[]
  sprayers: readonly Sprayer[]
  people: readonly Person[]
}

/** The stock of the open farm, and whether all of it is there. */
export function useRecordStock(): { stock: ComputedRef<RecordStock>; ready: ComputedRef<boolean>; error: ComputedRef<Error | null>; again: () => void } {
  const session = useSession()
  const farmId = computed(() => session.farmId)
  const reads = {
    farm: useFarm(farmId), blocks: useBlocks(farmId), materials: useMaterials(farmId),
    lots: useLots(farmId), sprayers: useSprayers(farmId), people: usePeople(farmId),
  }
  // A record can be written without the list of people: it is then the writer's own work.
  const needed = [reads.farm, reads.blocks, reads.materials, reads.lots, reads.sprayers]
  return {
    stock: computed(() => ({
      farmId: farmId.value,
      farm: reads.farm.data.value ?? null,
      blocks: reads.blocks.data.value ?? [],
      materials: reads.materials.data.value ?? [],
      lots: reads.lots.data.value ?? [],
      sprayers: reads.sprayers.data.value ?? [],
      people: reads.people.data.value ?? [],
    })),
    ready: computed(() => needed.every((read) => read.data.value !== undefined)),
    error: computed(() => needed.map((read) => (read.data.value === undefined ? read.error.value : null)).find((error) => error !== null) ?? null),
    again: () => { for (const read of Object.values(reads)) void read.refetch() },
  }
}
