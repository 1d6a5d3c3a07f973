import type { Basis } from '../../../shared/contract/recordContent.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import type { Material } from '../../entities/Material.ts'
import type { FieldError } from '../../errors.ts'

/** What a material cannot be measured out by: mass where it is kept by volume, and the other way round. */
export function findBasisFaults(basis: Basis, { measuredIn }: Pick<Material, 'measuredIn'>, path: string): FieldError[] {
  if (basis.kind === 'ratio') return measuredIn === 'mass' ? [{ path: `${path}.kind`, code: 'unit.not_volume' }] : []
  return measureOf(basis.unit) === measuredIn ? [] : [{ path: `${path}.unit`, code: `unit.needs_${measuredIn}` }]
}

/** Volume or mass, of an amount or of the amount in a rate over land. */
export function measureOf(unit: Exclude<Basis, { kind: 'ratio' }>['unit']): string {
  const dimension = dimensionOf(unit)
  return dimension === 'volume' || dimension === 'volumePerArea' ? 'volume' : 'mass'
}
