import type { Material } from '../../shared/contract/input.ts'
import { MASS_RATE_UNITS, MASS_UNITS, VOLUME_RATE_UNITS, VOLUME_UNITS } from '../../shared/contract/quantity.ts'
import type { Basis } from '../../shared/contract/recordContent.ts'

/** How a material may be measured out: by weight there are no parts of water. */
export function basisKinds(material: Pick<Material, 'measuredIn'> | null): Basis['kind'][] {
  return material?.measuredIn === 'mass' ? ['perArea', 'perTank'] : ['ratio', 'perArea', 'perTank']
}

/** Units that fit a material and how it is measured out; the first is taken where another was chosen before. */
export function basisUnits(kind: Basis['kind'], material: Pick<Material, 'measuredIn'> | null): readonly string[] {
  const isMass = material?.measuredIn === 'mass'
  if (kind === 'perArea') return isMass ? MASS_RATE_UNITS : VOLUME_RATE_UNITS
  if (kind === 'perTank') return isMass ? MASS_UNITS : VOLUME_UNITS
  return ['L']
}
