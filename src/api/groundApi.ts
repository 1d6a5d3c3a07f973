import { groundSchema, siteSchema, type GroundFeature, type Site } from '../../shared/contract/ground.ts'
import { allPages } from './allPages.ts'

/** Sites to keep clear of, and the farm's own ground plan; what ended too. */
export const groundApi = {
  sites: (farmId: string): Promise<Site[]> => allPages(`/farms/${farmId}/sites`, siteSchema),
  ground: (farmId: string): Promise<GroundFeature[]> => allPages(`/farms/${farmId}/ground`, groundSchema),
}
