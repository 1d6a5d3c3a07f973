import type { Lot as LotAnswer, Material as MaterialAnswer } from '../../../shared/contract/input.ts'
import type { Lot } from '../../entities/Lot.ts'
import type { Material } from '../../entities/Material.ts'

/** A material as the contract shows it. */
export function presentMaterial(material: Material): MaterialAnswer {
  return {
    id: material.id,
    name: material.name,
    kind: material.kind,
    measuredIn: material.measuredIn,
    organicStatus: material.organicStatus,
    statusBasis: material.statusBasis,
    label: material.label,
    revision: material.revision,
    createdAt: material.createdAt.toISOString(),
  }
}

/** A lot as the contract shows it, with what is left in the unit it was received in. */
export function presentLot(lot: Lot, materialName: string): LotAnswer {
  return {
    id: lot.id,
    materialId: lot.materialId,
    materialName,
    code: lot.code,
    origin: lot.origin,
    source: lot.source,
    receivedOn: lot.receivedOn,
    quantity: { value: lot.quantity, unit: lot.unit },
    left: { value: lot.leftQuantity, unit: lot.unit },
    expiresOn: lot.expiresOn,
    revision: lot.revision,
    createdAt: lot.createdAt.toISOString(),
  }
}
