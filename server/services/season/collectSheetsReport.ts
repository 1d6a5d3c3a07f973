import type { Language } from '../../../shared/messages/translate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { invalid } from '../../errors.ts'
import type { SheetsReportData } from '../../reports/seasonReportData.ts'
import { collectRecordReport } from '../records/collectRecordReport.ts'
import type { KeyedRow } from '../register/listRegister.ts'
import { readRegisterRows } from '../register/readRegisterRows.ts'
import type { Services } from '../services.ts'
import { asReaderOf } from './asReaderOf.ts'
import { describeSeason, seasonPlace } from './describeSeason.ts'

/** Records whose sheets go into one volume; two pages each as a rule, so that it stays under 150. */
export const SHEETS_A_VOLUME = 50

/** The sheets of a volume's records, in the order of their numbers. @throws {AppError} not-found, invalid-input for a volume there is not. */
export async function collectSheetsReport(
  services: Services, actor: FarmActor, { season, volume, language }: { season: number; volume: number; language: Language },
): Promise<SheetsReportData> {
  const reader = asReaderOf(actor, season)
  const ids: string[] = []
  for await (const { record_id } of readRegisterRows<KeyedRow>(services, reader, seasonPlace(season), { columns: 'd.state' })) ids.push(record_id)
  const volumes = Math.ceil(ids.length / SHEETS_A_VOLUME)
  if (volume > volumes) throw invalid([{ path: 'volume', code: 'field.too_big', params: { maximum: volumes } }])
  const records: SheetsReportData['records'][number][] = []
  for (const id of ids.slice((volume - 1) * SHEETS_A_VOLUME, volume * SHEETS_A_VOLUME)) records.push(await collectRecordReport(services, reader, id, { language }))
  return { farm: { name: actor.farmName, zone: actor.zone }, ...(await describeSeason(services, reader, season)), language, volume, volumes, records }
}
