import { shallowRef, watch, type ShallowRef } from 'vue'
import type { Boundary, PlaceGeometry } from '../../../shared/geo/geometryTypes.ts'

/** What has a distance kept clear round it, metres. */
export interface Kept { geometry: PlaceGeometry; keepClearM: number | null }

/**
 * The ground kept clear round each thing, in the same order; null where nothing is. What works it out is read when the first map asks for
 * it, and kept by the geometry, so that only what changed is worked out again.
 */
export function useRings(things: () => readonly Kept[]): ShallowRef<readonly (Boundary | null)[]> {
  const rings = shallowRef<readonly (Boundary | null)[]>([])
  const known = new Map<string, Boundary | null>()
  watch(things, async (list) => {
    if (list.every(({ keepClearM }) => keepClearM === null)) {
      rings.value = list.map(() => null)
      return
    }
    const { bufferPlace } = await import('../../../shared/geo/bufferPlace.ts')
    if (things() !== list) return
    rings.value = list.map(({ geometry, keepClearM }) => {
      if (keepClearM === null || !(keepClearM > 0)) return null
      const key = JSON.stringify([keepClearM, geometry.coordinates])
      if (!known.has(key)) known.set(key, bufferPlace(geometry, keepClearM))
      return known.get(key) ?? null
    })
  }, { immediate: true })
  return rings
}
