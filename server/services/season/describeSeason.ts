import { seasonOf } from '../../../shared/time/seasonOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { SeasonReportData } from '../../reports/seasonReportData.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import type { RegisterPlaceQuery } from '../register/listRegister.ts'
import type { Services } from '../services.ts'
import { readSeasonHead } from './readSeasonHead.ts'

/** The records of a season in the order of their numbers. */
export const seasonPlace = (season: number): RegisterPlaceQuery => ({ filter: { season }, sort: 'number' })

/** What report and sheets say of the season alike. */
export async function describeSeason(services: Services, reader: FarmActor, season: number): Promise<Pick<SeasonReportData, 'season' | 'isRunning' | 'head' | 'printedAt'>> {
  return {
    season,
    isRunning: seasonOf(farmToday(services, reader), reader.seasonStart) <= season,
    head: await services.database.inFarm(reader, (manager) => readSeasonHead(manager, reader, season)),
    printedAt: services.clock.now().toISOString(),
  }
}
