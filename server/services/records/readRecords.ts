import { z } from 'zod'
import type { Page } from '../../../shared/contract/common.ts'
import type { ApplicationRecord as RecordAnswer, RegisterRow } from '../../../shared/contract/record.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { notFound } from '../../errors.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import type { Services } from '../services.ts'
import { presentRecord } from './presentRecord.ts'
import { readSigned } from './readSigned.ts'

/** Times as this list writes them, in years that the database reads. */
const timeKey = z.iso.datetime({ precision: 3, abort: true }).refine((text) => /^(?:19|2\d)/.test(text))

interface ListedRow {
  id: string
  state: RegisterRow['state']
  register_row: Omit<RegisterRow, 'id' | 'state'>
  sort_at: Date
}

/** A page of the register, newest work first; with `block`, only records that have a line on it, with `state` only those. */
export async function listRecords(
  services: Services,
  actor: FarmActor,
  page: Page & { block?: string | undefined; state?: RegisterRow['state'] | undefined },
): Promise<{ items: RegisterRow[]; next: string | null }> {
  const after = decodeCursor(page.cursor, timeKey)
  const params: unknown[] = [actor.farmId, page.limit + 1]
  const add = (value: unknown) => `$${params.push(value)}`
  const onBlock = page.block === undefined ? '' : `JOIN record_lines l ON l.farm_id = r.farm_id AND l.record_id = r.id AND l.block_id = ${add(page.block)}`
  const order = page.block === undefined ? 'r.sort_at DESC, r.id DESC' : 'l.sort_at DESC, l.record_id DESC'
  const key = page.block === undefined ? '(r.sort_at, r.id)' : '(l.sort_at, l.record_id)'
  const from = after ? `AND ${key} < (${add(after.key)}::timestamptz, ${add(after.id)}::uuid)` : ''
  const inState = page.state === undefined ? '' : `AND r.state = ${add(page.state)}`
  const rows: ListedRow[] = await services.database.inFarm(actor, (manager) =>
    manager.query(
      `SELECT r.id, r.state, r.register_row, r.sort_at FROM application_records r ${onBlock}
       WHERE r.farm_id = $1 ${inState} ${from} ORDER BY ${order} LIMIT $2`,
      params,
    ),
  )
  return cutPage(
    rows,
    page.limit,
    ({ id, state, register_row }) => ({ id, state, ...register_row }),
    ({ sort_at, id }) => [sort_at.toISOString(), id],
  )
}

/** One record. @throws {AppError} not-found. */
export async function getRecord(services: Services, actor: FarmActor, id: string): Promise<RecordAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    return presentRecord(manager, record)
  })
}

/** Every signed version of a record, oldest first, with the text that its digest is over. @throws {AppError} not-found. */
export async function listRecordVersions(
  services: Services,
  actor: FarmActor,
  id: string,
): Promise<{ items: { version: number; digest: string; canonicalText: string; signed: SignedRecord }[]; next: null }> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    const versions = await manager.find(RecordVersion, { where: { farmId: actor.farmId, recordId: id }, order: { version: 'ASC' } })
    return {
      items: versions.map((row) => ({ version: row.version, digest: row.digest, canonicalText: row.canonicalText, signed: readSigned(row) })),
      next: null,
    }
  })
}
