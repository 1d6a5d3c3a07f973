import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { RecordGround } from './loadRecordGround.ts'

/**
 * Ground on which what a version already rested on stands as it stood then: boundary, label, lot, sprayer. What it did not
 * name is as it is now. What is left of a lot is always the book's.
 */
export function restOn(ground: RecordGround, { blocks, materials, lots, sprayer }: SignedRecord): RecordGround {
  const then = <Thing extends { id: string }>(things: Thing[], stood: readonly ({ id: string } & Partial<Thing>)[]) =>
    things.map((thing) => ({ ...thing, ...stood.find(({ id }) => id === thing.id) }))
  return {
    blocks: then(ground.blocks, blocks),
    materials: then(ground.materials, materials),
    lots: then(ground.lots, lots),
    sprayer: ground.sprayer && ground.sprayer.id === sprayer?.id ? { ...ground.sprayer, ...sprayer } : ground.sprayer,
    calibration: ground.calibration,
  }
}
