import type { EntityManager } from 'typeorm'
import type { AmendRecord } from '../../../shared/contract/recordChanges.ts'
import type { BlockLine, RecordContent } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import { findDoer } from './assertMayWrite.ts'
import { writeOutAmounts } from './writeOutAmounts.ts'

/**
 * What an amended record says: what is sent over what stands. An instant that is the same one keeps its spelling, and an amount
 * that was the sheet's own is worked out anew.
 */
export async function mergeAmendment(manager: EntityManager, actor: FarmActor, before: SignedRecord, input: AmendRecord): Promise<RecordContent> {
  const { reason: _reason, password: _password, revision: _revision, deviceAt: _deviceAt, acknowledged: _acknowledged, ...sent } = input
  const standing = before.content
  const merged: RecordContent = { ...standing, ...sentOnly(sent), doneById: sent.doneById ?? standing.doneById }
  if (merged.doneById !== standing.doneById) await findDoer(manager, actor, merged)
  const worked = writeOutAmounts({ ...standing, lines: standing.lines.map((line) => ({ ...line, amount: null })) }, sheetOf(standing, before))
  const lines = merged.lines.map((line, index) => {
    const stood = standing.lines[index]
    return stood?.blockId === line.blockId ? keepSpelling(line, stood, worked.lines[index]) : line
  })
  return { ...merged, lines }
}

function sentOnly(sent: Partial<Record<keyof RecordContent, unknown>>): Partial<RecordContent> {
  return Object.fromEntries(Object.entries(sent).filter(([, value]) => value !== undefined)) as Partial<RecordContent>
}

function keepSpelling(line: BlockLine, stood: BlockLine, worked: BlockLine | undefined): BlockLine {
  const same = (now: string | null, then: string | null) => (now !== null && then !== null && Date.parse(now) === Date.parse(then) ? then : now)
  const isSheets = line.amount !== null && isSameAmount(line.amount, stood.amount) && isSameAmount(line.amount, worked?.amount ?? null)
  return {
    ...line,
    startedAt: same(line.startedAt, stood.startedAt),
    endedAt: same(line.endedAt, stood.endedAt),
    amount: isSheets ? null : line.amount,
  }
}

function isSameAmount(one: BlockLine['amount'], other: BlockLine['amount']): boolean {
  return one?.unit === other?.unit && one?.known === other?.known && Number(one?.value) === Number(other?.value)
}
