import type { EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { ApplicationRecord as RecordAnswer, RecordContent } from '../../../shared/contract/record.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError, invalid, notFound, unlikely } from '../../errors.ts'
import type { Services } from '../services.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { drawLots } from './drawLots.ts'
import { findRecordFaults } from './findRecordFaults.ts'
import { findMissing, findUnlikely } from './findSigningFaults.ts'
import { judgeRecord, type JudgedRecord } from './judgeRecord.ts'
import { loadRecordGround, type RecordGround } from './loadRecordGround.ts'
import { planDraws, type Draw } from './planDraws.ts'
import { presentRecord } from './presentRecord.ts'
import { writeVersion } from './writeVersion.ts'

/** A worked-out amount is written to a tenth of a millilitre. */
const AMOUNT_DECIMALS = 4

/**
 * Signs a record: judges it as it stands, draws its lots down, gives it its number and its entry in the log.
 * Signing again what is signed answers with it. All of it happens, or nothing.
 * @throws {AppError} not-found, forbidden, invalid-input, or `unlikely` while a stop or a late entry has no reason.
 */
export async function sealRecord(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: FarmActor,
  id: string,
  acknowledged: Acknowledged,
): Promise<RecordAnswer> {
  const record = await manager.findOne(ApplicationRecord, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!record) throw notFound()
  assertMayWrite(actor, record)
  if (record.state === 'signed') return presentRecord(manager, record)
  if (record.state === 'withdrawn') throw new AppError('conflict', 'record.signed')
  const now = services.clock.now()
  const ground = await loadRecordGround(manager, actor, record.content, true)
  const judged = judgeRecord(record.content, ground, actor.zone, now)
  const content = writeOutAmounts(record.content, judged.sheet)
  const draws = planDraws(listDraws(content, ground, judged), acknowledged)
  const faults = [...findRecordFaults(content, ground, now), ...findMissing(content, judged.sheet), ...draws.faults]
  if (faults.length > 0) throw invalid(faults)
  const doubts = [...draws.doubts, ...findUnlikely(content, judged.checks, acknowledged, now)]
  if (doubts.length > 0) throw unlikely(doubts)
  await drawLots(manager, draws.entries, { recordId: id, personId: personOf(actor), at: now })
  return presentRecord(manager, await writeVersion(services, manager, actor, { record, content, ground, judged, acknowledged, now }))
}

/** Where no amount was written for a line, its share of the total stands there, said to be worked out. */
function writeOutAmounts(content: RecordContent, sheet: RecordSheet): RecordContent {
  const lines = content.lines.map((line, index) => {
    const share = sheet.lines[index]?.shareL ?? null
    if (line.amount !== null || share === null) return line
    return { ...line, amount: { value: roundDecimal(share, AMOUNT_DECIMALS), unit: 'L' as const, known: 'workedOut' as const } }
  })
  return { ...content, lines }
}

function listDraws(content: RecordContent, { lots }: RecordGround, { computed }: JudgedRecord): Draw[] {
  return content.components.flatMap(({ lotId }, index) => {
    const lot = lots.find(({ id }) => id === lotId)
    const amount = computed.components[index]?.amount
    return lot && amount ? [{ lot, amount, path: `components.${index}.lotId` }] : []
  })
}
