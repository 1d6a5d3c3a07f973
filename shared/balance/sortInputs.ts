import type { Lot, Material } from '../contract/input.ts'
import { lotStanding } from './lotStanding.ts'
import { compareCodes } from '../records/compareCodes.ts'

/**
 * Lots with what needs eyes first: past their last day, soon there, nearly empty, the rest by last day, empty ones at the end.
 * @param today civil date of the farm, YYYY-MM-DD.
 */
export function sortLots<Item extends Lot>(lots: readonly Item[], today: string): Item[] {
  const ranked = lots.map((lot) => ({ lot, rank: rankOfLot(lot, today) }))
  ranked.sort(
    (a, b) => a.rank - b.rank || compareDays(a.lot.expiresOn, b.lot.expiresOn) || compareCodes(a.lot.code, b.lot.code),
  )
  return ranked.map(({ lot }) => lot)
}

/** Materials with what needs eyes first: prohibited, not known, restricted, allowed; then by name. */
export function sortMaterials<Item extends Material>(materials: readonly Item[]): Item[] {
  return materials.toSorted((a, b) => rankOfMaterial(a) - rankOfMaterial(b) || a.name.localeCompare(b.name))
}

function rankOfLot(lot: Lot, today: string): number {
  const { useBy, stock } = lotStanding(lot, today)
  if (stock === 'empty') return 4
  if (useBy === 'past') return 0
  if (useBy === 'soon') return 1
  return stock === 'low' ? 2 : 3
}

function rankOfMaterial(material: Material): number {
  if (material.organicStatus === 'prohibited') return 0
  if (material.organicStatus === 'unknown' || material.statusBasis === null) return 1
  return material.organicStatus === 'restricted' ? 2 : 3
}

/** Earlier first; without a last day comes after every dated one. */
function compareDays(a: string | null, b: string | null): number {
  if (a === b) return 0
  if (a === null) return 1
  return b === null || a < b ? -1 : 1
}
