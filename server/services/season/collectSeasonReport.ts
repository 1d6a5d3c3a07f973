import { In } from 'typeorm'
import type { Computed, RegisterRow } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { ReportVolumes } from '../../../shared/contract/seasonReport.ts'
import { cutCheckCode } from '../../../shared/evidence/checkCode.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { fillComputed, fillContent } from '../../../shared/records/fillStored.ts'
import { openSeasonSummary } from '../../../shared/season/openSeasonSummary.ts'
import type { BlockSummary, SeasonSummary } from '../../../shared/season/summaryTypes.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import type { SeasonReportData, SummaryBlock } from '../../reports/seasonReportData.ts'
import { readCertificates } from '../farms/certificates.ts'
import { publicAddress } from '../publicAddress.ts'
import { collectVolume, countVolumes } from '../register/collectRegisterReport.ts'
import type { KeyedRow } from '../register/listRegister.ts'
import { readRegisterRows } from '../register/readRegisterRows.ts'
import type { Services } from '../services.ts'
import { asReaderOf } from './asReaderOf.ts'
import { SHEETS_A_VOLUME } from './collectSheetsReport.ts'
import { describeSeason, seasonPlace } from './describeSeason.ts'

interface SummaryRow extends KeyedRow {
  state: 'signed' | 'withdrawn'
  register_row: Omit<RegisterRow, 'id' | 'state'>
  content: RecordContent
  computed: Computed
}
interface Wanted { season: number; language: Language }

/** Into how many volumes the report and the sheets of a season go. @throws {AppError} not-found for a season not open to the reader. */
export async function countSeasonVolumes(services: Services, actor: FarmActor, { season, language }: Wanted): Promise<ReportVolumes> {
  const { volumes, records } = await countVolumes(services, asReaderOf(actor, season), seasonPlace(season), language)
  return { records, report: { volumes }, sheets: { volumes: Math.ceil(records / SHEETS_A_VOLUME) } }
}

/** Everything a volume of the season report shows. @throws {AppError} not-found, invalid-input for a volume there is not. */
export async function collectSeasonReport(services: Services, actor: FarmActor, { season, volume, language }: Wanted & { volume: number }): Promise<SeasonReportData> {
  const reader = asReaderOf(actor, season)
  const { rows, volumes } = await collectVolume(services, reader, seasonPlace(season), { volume, language })
  const { figures, blocks } = await addUpSeason(services, reader, season)
  const described = await describeSeason(services, reader, season)
  const checkPage = `${publicAddress(services.config)}/check`
  return {
    farm: { name: actor.farmName, zone: actor.zone },
    ...described,
    language, volume, volumes, rows, figures,
    certificates: await services.database.inFarm(reader, (manager) => readCertificates(manager, reader)),
    span: seasonSpan(season, actor.seasonStart),
    blocks: volume === 1 ? await describeBlocks(services, reader, blocks) : [],
    checkPage: checkPage.replace(/^https?:\/\//, ''),
    checkUrl: described.head && `${checkPage}/${cutCheckCode(described.head.digest)}`,
  }
}

async function addUpSeason(services: Services, reader: FarmActor, season: number): Promise<SeasonSummary> {
  const summary = openSeasonSummary(reader.zone)
  for await (const row of readRegisterRows<SummaryRow>(services, reader, seasonPlace(season), { columns: 'd.state, d.register_row, d.content, d.computed' })) {
    summary.add({ state: row.state, row: row.register_row, content: fillContent(row.content), computed: fillComputed(row.computed) })
  }
  return summary.finish()
}

async function describeBlocks(services: Services, reader: FarmActor, blocks: readonly BlockSummary[]): Promise<SummaryBlock[]> {
  const known = await services.database.inFarm(reader, (manager) => manager.find(Block, {
    select: { id: true, crop: true, areaM2: true, geometry: true }, where: { farmId: reader.farmId, id: In(blocks.flatMap(({ blockId }) => blockId || [])) },
  }))
  return blocks.map((block) => {
    const now = known.find(({ id }) => id === block.blockId)
    return { ...block, crop: now?.crop ?? null, areaM2: now?.areaM2 ?? null, geometry: now?.geometry ?? null }
  })
}

function seasonSpan(season: number, seasonStart: string): { from: string; to: string } {
  return { from: `${season}-${seasonStart}`, to: addDays(`${season + 1}-${seasonStart}`, -1) }
}
