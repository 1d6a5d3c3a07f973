import type { EntityManager } from 'typeorm'
import type { RegisterRow } from '../../../shared/contract/record.ts'
import type { RegisterVolumes } from '../../../shared/contract/register.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { Material } from '../../entities/Material.ts'
import { Person } from '../../entities/Person.ts'
import { invalid } from '../../errors.ts'
import { openCutter } from '../../reports/register/cutVolumes.ts'
import { rowHeightBound } from '../../reports/register/rowHeight.ts'
import type { RegisterReportData } from '../../reports/registerReportData.ts'
import { readCertificates } from '../farms/certificates.ts'
import { publicAddress } from '../publicAddress.ts'
import type { Services } from '../services.ts'
import { cursorAfter, type KeyedRow, type RegisterPlaceQuery } from './listRegister.ts'
import { readRegisterRows } from './readRegisterRows.ts'
import { registerTotals } from './registerTotals.ts'

interface PrintRow extends KeyedRow { state: RegisterRow['state']; register_row: Omit<RegisterRow, 'id' | 'state'>; digest: string | null }
/** Where a volume begins and how many records it holds. */
interface Volume { cursor: string | undefined; records: number }

const COLUMNS = 'd.state, d.register_row, d.digest'

/** Into how many volumes the records of a filter go. */
export async function countVolumes(services: Services, actor: FarmActor, place: RegisterPlaceQuery, language: Language): Promise<RegisterVolumes> {
  const volumes = await cutVolumes(services, actor, place, language)
  return { volumes: volumes.length, records: volumes.reduce((sum, { records }) => sum + records, 0), items: volumes.map(({ records }) => ({ records })) }
}

/** Everything one volume of the printed register shows. @throws {AppError} invalid-input for a volume there is not. */
export async function collectRegisterReport(
  services: Services, actor: FarmActor, place: RegisterPlaceQuery, { volume, language }: { volume: number; language: Language },
): Promise<RegisterReportData> {
  const { rows, volumes } = await collectVolume(services, actor, place, { volume, language })
  return {
    farm: { name: actor.farmName, zone: actor.zone },
    language, volume, volumes, filter: place.filter, sort: place.sort, rows,
    names: await services.database.inFarm(actor, (manager) => nameFilter(manager, actor, place.filter)),
    certificates: await services.database.inFarm(actor, (manager) => readCertificates(manager, actor)),
    totals: await registerTotals(services, actor, place.filter),
    printedAt: services.clock.now().toISOString(),
    checkPage: `${publicAddress(services.config)}/check`.replace(/^https?:\/\//, ''),
  }
}

/** The rows of one volume, and how many volumes there are. @throws {AppError} invalid-input for a volume there is not. */
export async function collectVolume(
  services: Services, actor: FarmActor, place: RegisterPlaceQuery, { volume, language }: { volume: number; language: Language },
): Promise<Pick<RegisterReportData, 'rows' | 'volumes'>> {
  const volumes = await cutVolumes(services, actor, place, language)
  const wanted = volumes[volume - 1]
  if (wanted === undefined) throw invalid([{ path: 'volume', code: 'field.too_big', params: { maximum: volumes.length } }])
  const rows: RegisterReportData['rows'][number][] = []
  if (wanted.records > 0) {
    const read = readRegisterRows<PrintRow>(services, actor, place, { columns: COLUMNS, cursor: wanted.cursor, limit: wanted.records })
    for await (const { state, register_row, digest } of read) rows.push({ ...register_row, state, digest })
  }
  return { rows, volumes: volumes.length }
}

/** Reads through the records once; at least one volume, if an empty one. */
async function cutVolumes(services: Services, actor: FarmActor, place: RegisterPlaceQuery, language: Language): Promise<Volume[]> {
  const cutter = openCutter()
  const volumes: Volume[] = []
  let before: KeyedRow | null = null
  for await (const row of readRegisterRows<PrintRow>(services, actor, place, { columns: COLUMNS })) {
    const height = rowHeightBound({ ...row.register_row, state: row.state, digest: row.digest }, { language, zone: actor.zone })
    if (cutter.take(height)) volumes.push({ cursor: before === null ? undefined : cursorAfter(place, before), records: 0 })
    const last = volumes.at(-1)
    if (last) last.records += 1
    before = row
  }
  return volumes.length === 0 ? [{ cursor: undefined, records: 0 }] : volumes
}

async function nameFilter(manager: EntityManager, { farmId }: FarmActor, { block, material, person }: RegisterPlaceQuery['filter']): Promise<RegisterReportData['names']> {
  const found = {
    block: block === undefined ? null : await manager.findOneBy(Block, { farmId, id: block }),
    material: material === undefined ? null : await manager.findOneBy(Material, { farmId, id: material }),
    person: person === undefined ? null : await manager.findOneBy(Person, { farmId, id: person }),
  }
  return { block: found.block?.code ?? null, material: found.material?.name ?? null, person: found.person?.name ?? null }
}
