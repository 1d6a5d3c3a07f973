import type { Check } from '../../../shared/contract/record.ts'
import { findOverlaps } from '../../../shared/geo/findOverlaps.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import type { MapSite } from '../map/mapGround.ts'

/** What the sites that are written down say of a block, for its line in the column. */
export type Nearby = Pick<Check, 'verdict'> & { text: string; sites: string }

/**
 * Which distances reach into a block, as drawn: those are a caution. Where none does it stays not known, for what nobody wrote down may be
 * there all the same; null while no site of the farm is written down.
 */
export function blockNearby(geometry: Boundary, sites: readonly MapSite[]): Nearby | null {
  if (sites.length === 0) return null
  const { overlaps, tooFine } = findOverlaps(geometry, sites.flatMap(({ id, name, ring }) => (ring === null ? [] : [{ id, code: name, geometry: ring }])))
  const reached = [...overlaps, ...tooFine].map(({ code }) => code)
  return reached.length === 0 ? { verdict: 'unknown', text: 'blocks.allows.nearby.clear', sites: '' } : { verdict: 'caution', text: 'blocks.allows.nearby.within', sites: reached.join(', ') }
}
