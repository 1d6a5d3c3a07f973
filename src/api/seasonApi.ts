import { reportVolumesSchema, seasonsSchema, type ReportVolumes, type Season } from '../../shared/contract/seasonReport.ts'
import { http } from './http.ts'

/** Seasons of a farm and what goes out of them. */
export const seasonApi = {
  list: async (farmId: string): Promise<Season[]> => (await http.get(`/farms/${farmId}/seasons`, seasonsSchema)).items,
  volumes: (farmId: string, season: number, language: string): Promise<ReportVolumes> => http.get(`/farms/${farmId}/seasons/${season}/volumes`, reportVolumesSchema, { language }),
}
