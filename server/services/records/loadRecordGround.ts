import { In, type EntityManager } from 'typeorm'
import type { CalibrationInForce } from '../../../shared/contract/calibration.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { firstStart } from '../../../shared/records/registerRow.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { together } from '../../database/together.ts'
import { Block } from '../../entities/Block.ts'
import { Lot } from '../../entities/Lot.ts'
import { Material } from '../../entities/Material.ts'
import { Sprayer } from '../../entities/Sprayer.ts'
import { invalid, type FieldError } from '../../errors.ts'
import { listInForce } from '../farms/calibrationInForce.ts'

/** What a record rests on, as it stands now; each in the order of the record. */
export interface RecordGround {
  blocks: Block[]
  materials: Material[]
  lots: Lot[]
  sprayer: Sprayer | null
  /** What the sprayer was measured at, up to the day of the work. */
  calibration: CalibrationInForce | null
}

/**
 * Loads what a record names. With `forSigning` its lots stay locked until the transaction ends, in the order of
 * their ids, so that two signatures never wait for each other crosswise.
 * @throws {AppError} invalid-input naming everything that is not on this farm.
 */
export async function loadRecordGround(
  manager: EntityManager,
  { farmId, zone }: Pick<FarmActor, 'farmId' | 'zone'>,
  content: RecordContent,
  forSigning = false,
): Promise<RecordGround> {
  const lotIds = unique(content.components.flatMap(({ lotId }) => (lotId === null ? [] : [lotId])))
  const [blocks, materials, lots, sprayer] = await together([
    manager.findBy(Block, { farmId, id: In(unique(content.lines.map(({ blockId }) => blockId))) }),
    manager.findBy(Material, { farmId, id: In(unique(content.components.map(({ materialId }) => materialId))) }),
    lotIds.length === 0 ? [] : manager.find(Lot, {
      where: { farmId, id: In(lotIds) },
      order: { id: 'ASC' },
      ...(forSigning && { lock: { mode: 'pessimistic_write' as const } }),
    }),
    content.sprayerId === null ? null : manager.findOneBy(Sprayer, { farmId, id: content.sprayerId }),
  ])
  const start = firstStart(content)
  const calibration = sprayer === null ? null : (await listInForce(manager, [sprayer], start === null ? undefined : civilDateIn(zone, start))).get(sprayer.id) ?? null
  const inOrder = <Thing extends { id: string }>(things: Thing[], ids: (string | null)[]) => things.sort((a, b) => ids.indexOf(a.id) - ids.indexOf(b.id))
  const ground = {
    blocks: inOrder(blocks, content.lines.map(({ blockId }) => blockId)),
    materials: inOrder(materials, content.components.map(({ materialId }) => materialId)),
    lots: inOrder(lots, content.components.map(({ lotId }) => lotId)),
    sprayer,
    calibration,
  }
  const errors = findUnknown(content, ground)
  if (errors.length > 0) throw invalid(errors)
  return ground
}

function findUnknown(content: RecordContent, { blocks, materials, lots, sprayer }: RecordGround): FieldError[] {
  const has = (things: { id: string }[], id: string) => things.some((thing) => thing.id === id)
  return [
    ...content.lines.flatMap(({ blockId }, index) => (has(blocks, blockId) ? [] : [{ path: `lines.${index}.blockId`, code: 'block.unknown' }])),
    ...content.components.flatMap(({ materialId, lotId }, index) => [
      ...(has(materials, materialId) ? [] : [{ path: `components.${index}.materialId`, code: 'material.unknown' }]),
      ...(lotId === null || has(lots, lotId) ? [] : [{ path: `components.${index}.lotId`, code: 'lot.unknown' }]),
    ]),
    ...(content.sprayerId !== null && sprayer === null ? [{ path: 'sprayerId', code: 'sprayer.unknown' }] : []),
  ]
}

function unique(ids: string[]): string[] {
  return [...new Set(ids)].sort()
}
