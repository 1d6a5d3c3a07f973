import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { invalid, unlikely, type FieldError } from '../../errors.ts'
import { findRecordFaults } from './findRecordFaults.ts'
import { findMissing, findUnlikely } from './findSigningFaults.ts'
import { findClockDoubts, findSuspectDoses } from './findSuspect.ts'
import { judgeRecord, type JudgedRecord } from './judgeRecord.ts'
import type { RecordGround } from './loadRecordGround.ts'
import { listDraws, planDraws, type DrawEntry } from './planDraws.ts'
import { writeOutAmounts } from './writeOutAmounts.ts'

interface Weighing {
  written: RecordContent
  ground: RecordGround
  zone: string
  now: Date
  /** When it was first signed: an entry is late by that, not by what was mended afterwards. */
  firstSignedAt: Date
  /** What the device's clock said, and when it came in. */
  sent: { deviceAt: Date | null; receivedAt: Date }
  /** Reasons given for what is unlikely, once it is known what was judged. */
  reasons: (judged: JudgedRecord, content: RecordContent) => Acknowledged
}

/** What a version says and takes. */
interface WeighedRecord {
  content: RecordContent
  judged: JudgedRecord
  acknowledged: Acknowledged
  draws: DrawEntry[]
}

/**
 * Judges what is about to be signed, and what it takes out of its lots.
 * @throws {AppError} invalid-input for what is impossible or missing, `unlikely` while a doubt has no reason.
 */
export function weighRecord({ written, ground, zone, now, firstSignedAt, sent, reasons }: Weighing): WeighedRecord {
  const judged = judgeRecord(written, ground, zone, now)
  const content = writeOutAmounts(written, judged.sheet)
  const asked = listDraws(content, ground, judged.computed)
  const suspects = [...findSuspectDoses(judged.checks), ...findClockDoubts(sent)]
  const doubtsOf = (given: Acknowledged) => [
    ...planDraws(asked, given).doubts, ...findUnlikely(content, judged, given, firstSignedAt), ...suspects.filter(({ code }) => !given.some((one) => one.code === code)),
  ]
  const acknowledged = keepAsked(reasons(judged, content), doubtsOf([]), judged.checks)
  const draws = planDraws(asked, acknowledged)
  const faults = [...findRecordFaults(content, ground, now), ...findMissing(content, judged.sheet), ...draws.faults]
  if (faults.length > 0) throw invalid(faults)
  const doubts = doubtsOf(acknowledged)
  if (doubts.length > 0) throw unlikely(doubts)
  return { content, judged, acknowledged, draws: draws.entries }
}

/** Reasons that something in the record asks for; others do not belong into what is signed. */
function keepAsked(given: Acknowledged, doubts: FieldError[], checks: Check[]): Acknowledged {
  const stops = checks.filter(({ verdict }) => verdict === 'stop').map(({ code }) => code)
  const codes = new Set([...doubts.map(({ code }) => code), ...stops, ...(stops.length > 0 ? ['record.stop'] : [])])
  return given.filter(({ code }) => codes.has(code))
}
