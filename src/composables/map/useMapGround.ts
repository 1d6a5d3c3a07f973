import { computed, type ComputedRef } from 'vue'
import type { Site } from '../../../shared/contract/ground.ts'
import { useSession } from '../../stores/session.ts'
import type { MapGround } from './mapGround.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useGround, useSites } from '../block/useGround.ts'
import { useRings, type Kept } from '../block/useRings.ts'

/** The open farm's ground and sites of today, as the map draws them. */
export function useMapGround(): ComputedRef<MapGround> {
  const session = useSession()
  const { today } = useFarmDay()
  const ground = useGround(() => session.farmId)
  const sites = useSites(() => session.farmId)
  const isThere = ({ endedOn }: { endedOn: string | null }): boolean => endedOn === null || today.value === null || endedOn > today.value
  const there = computed<readonly Site[]>(() => (sites.data.value ?? []).filter(isThere))
  const kept = computed<readonly Kept[]>(() => there.value.map(({ geometry, keepClearM }) => ({ geometry, keepClearM: keepClearM === null ? null : Number(keepClearM) })))
  const rings = useRings(() => kept.value)
  const features = computed(() => (ground.data.value ?? []).filter(isThere).map(({ id, kind, name, geometry, widthM }) => ({
    id, kind, name, geometry, widthM: widthM === null ? null : Number(widthM),
  })))
  return computed(() => ({
    features: features.value,
    sites: there.value.map(({ id, kind, name, geometry }, index) => ({ id, kind, name, geometry, ring: rings.value[index] ?? null })),
  }))
}
