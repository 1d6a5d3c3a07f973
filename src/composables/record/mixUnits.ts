import { EACH, type Each } from '../../../shared/contract/each.ts'
import type { Material } from '../../../shared/contract/input.ts'
import { MASS_RATE_UNITS, MASS_UNITS, VOLUME_RATE_UNITS, VOLUME_UNITS } from '../../../shared/contract/quantity.ts'
import type { Basis, Method, Water } from '../../../shared/contract/recordContent.ts'
import type { ComponentDraft } from './recordDraft.ts'

type Measured = Pick<Material, 'measuredIn'> | null

/** One way to measure an ingredient out, as it is chosen from a list: the kind of its basis, how a ratio is read, what is counted. */
type BasisChoice = 'ratioTo' | 'ratioIn' | 'perArea' | Each | 'perTank' | 'total'

/** How a material may be measured out: by weight there are no parts of water, and what is spread dry has neither water nor tank. */
export function basisChoices(material: Measured, method: Method): BasisChoice[] {
  const isWet = method !== 'solid'
  const ratios: BasisChoice[] = isWet && material?.measuredIn !== 'mass' ? ['ratioTo', 'ratioIn'] : []
  return [...ratios, 'perArea', ...EACH, ...(isWet ? ['perTank' as const] : []), 'total']
}

export function choiceOf({ kind, reading, each }: Pick<ComponentDraft, 'kind' | 'reading' | 'each'>): BasisChoice {
  if (kind === 'ratio') return reading === 'in' ? 'ratioIn' : 'ratioTo'
  return kind === 'perEach' ? each : kind
}

/** What a choice changes on an ingredient. */
export function chosenBasis(choice: BasisChoice): Partial<Pick<ComponentDraft, 'kind' | 'reading' | 'each'>> {
  switch (choice) {
    case 'ratioTo':
    case 'ratioIn':
      return { kind: 'ratio', reading: choice === 'ratioIn' ? 'in' : 'to' }
    case 'perArea':
    case 'perTank':
    case 'total':
      return { kind: choice }
    default:
      return { kind: 'perEach', each: choice }
  }
}

/** Units that fit a material and how it is measured out; the first is taken where another was chosen before. */
export function basisUnits(kind: Basis['kind'], material: Measured): readonly string[] {
  const isMass = material?.measuredIn === 'mass'
  if (kind === 'ratio') return ['L']
  if (kind === 'perArea') return isMass ? MASS_RATE_UNITS : VOLUME_RATE_UNITS
  return isMass ? MASS_UNITS : VOLUME_UNITS
}

/** Ways to size a mix, as they are chosen. */
export const SIZE_WAYS = ['water', 'sprayRate', 'perEach', 'jar', 'none'] as const satisfies readonly Water['sizedFrom'][]

/** Units of what sizes a mix. A jar is measured as its lot is. */
export function sizeUnits(sizedFrom: Water['sizedFrom'], material: Measured): readonly string[] {
  if (sizedFrom === 'sprayRate') return VOLUME_RATE_UNITS
  return sizedFrom === 'jar' ? basisUnits('total', material) : VOLUME_UNITS
}

/** What a press on minus or plus changes of a figure in a unit: about a fiftieth of what is usual. */
export function stepOf(unit: string): number {
  if (unit === 'mL' || unit === 'mL/ha') return 5
  if (unit === 'L/ha') return 25
  if (unit === 'g') return 10
  return 1
}
