import { buildCheck, words } from '../checks/buildCheck.ts'
import { roundForReader } from '../checks/roundForReader.ts'
import type { Lot, Material } from '../contract/input.ts'
import type { Check } from '../contract/record.ts'
import { lotStanding } from './lotStanding.ts'

/**
 * Lots past their last day that still hold something, each a caution while it only stands there: by its label where a
 * labelled product was bought, else by the farm's own date.
 * @param today civil date of the farm, YYYY-MM-DD.
 */
export function pastLotChecks(lots: readonly Lot[], materials: readonly Material[], today: string): Check[] {
  return lots.flatMap((lot) => {
    const { useBy, stock } = lotStanding(lot, today)
    if (useBy !== 'past' || stock === 'empty' || lot.expiresOn === null) return []
    const labelled = lot.origin === 'bought' && materials.some(({ id, label }) => id === lot.materialId && label !== null)
    return [
      buildCheck({
        code: 'lot.pastUse',
        verdict: 'caution',
        rests: labelled ? 'label' : 'house',
        title: words('inputs.pastTitle', { code: lot.code }),
        text: words(labelled ? 'inputs.pastByLabel' : 'inputs.pastByFarm', { name: lot.materialName, lastOn: lot.expiresOn }),
        figure: words('inputs.leftFigure', { value: roundForReader(lot.left.value), unit: lot.left.unit }),
        about: `lot:${lot.id}`,
      }),
    ]
  })
}
