import type { EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { ApplicationRecord as RecordAnswer, Check, RecordContent, SignRecord } from '../../../shared/contract/record.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError, invalid, notFound, stale, unlikely, type FieldError } from '../../errors.ts'
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
 * @throws {AppError} not-found, forbidden, `stale` if it is not the revision that the signer saw, invalid-input, or
 *   `unlikely` while a stop, a short lot or a late entry has no reason.
 */
export async function sealRecord(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: FarmActor,
  id: string,
  input: Pick<SignRecord, 'acknowledged' | 'revision'>,
): Promise<RecordAnswer> {
  const record = await manager.findOne(ApplicationRecord, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!record) throw notFound()
  assertMayWrite(actor, record)
  if (record.state === 'signed') return presentRecord(manager, record)
  if (record.state === 'withdrawn') throw new AppError('conflict', 'record.signed')
  if (input.revision !== undefined && input.revision !== record.revision) throw stale(await presentRecord(manager, record))
  const now = services.clock.now()
  const ground = await loadRecordGround(manager, actor, record.content, true)
  const judged = judgeRecord(record.content, ground, actor.zone, now)
  const content = writeOutAmounts(record.content, judged.sheet)
  const asked = listDraws(content, ground, judged)
  const acknowledged = keepAsked(input.acknowledged, [...planDraws(asked, []).doubts, ...findUnlikely(content, judged, [], now)], judged.checks)
  const draws = planDraws(asked, acknowledged)
  const faults = [...findRecordFaults(content, ground, now), ...findMissing(content, judged.sheet), ...draws.faults]
  if (faults.length > 0) throw invalid(faults)
  const doubts = [...draws.doubts, ...findUnlikely(content, judged, acknowledged, now)]
  if (doubts.length > 0) throw unlikely(doubts)
  await drawLots(manager, draws.entries, { recordId: id, personId: personOf(actor), at: now })
  return presentRecord(manager, await writeVersion(services, manager, actor, { record, content, ground, judged, acknowledged, now }))
}

/** Reasons that something in the record asks for; others do not belong into what is signed. */
function keepAsked(given: Acknowledged, doubts: FieldError[], checks: Check[]): Acknowledged {
  const stops = checks.filter(({ verdict }) => verdict === 'stop').map(({ code }) => code)
  const codes = new Set([...doubts.map(({ code }) => code), ...stops, ...(stops.length > 0 ? ['record.stop'] : [])])
  return given.filter(({ code }) => codes.has(code))
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
