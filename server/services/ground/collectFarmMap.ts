import { IsNull } from 'typeorm'
import type { Language } from '../../../shared/messages/translate.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { GroundFeature } from '../../entities/GroundFeature.ts'
import { Site } from '../../entities/Site.ts'
import type { FarmMapData } from '../../reports/farmMapReportData.ts'
import type { Services } from '../services.ts'

/** Everything the printed map shows: the blocks open to whoever asks, the ground and the sites as they stand today. */
export async function collectFarmMap(services: Services, actor: FarmActor, { paper, language }: Pick<FarmMapData, 'paper'> & { language: Language }): Promise<FarmMapData> {
  const printedAt = services.clock.now().toISOString()
  const today = civilDateIn(actor.zone, printedAt)
  const isThere = ({ endedOn }: { endedOn: string | null }): boolean => endedOn === null || endedOn > today
  const metres = (text: string | null): number | null => (text === null ? null : Number(text))
  return services.database.inFarm(actor, async (manager) => {
    const { farmId } = actor
    const blocks = await manager.find(Block, { where: { farmId, endedOn: IsNull() }, order: { code: 'ASC', id: 'ASC' } })
    const ground = await manager.find(GroundFeature, { where: { farmId }, order: { name: 'ASC', id: 'ASC' } })
    const sites = await manager.find(Site, { where: { farmId }, order: { name: 'ASC', id: 'ASC' } })
    return {
      farm: { name: actor.farmName, zone: actor.zone }, language, paper, printedAt,
      blocks: blocks.map(({ code, name, crop, areaM2, geometry }) => ({ code, name, crop, areaM2: Number(areaM2), geometry })),
      ground: ground.filter(isThere).map(({ kind, name, geometry, widthM }) => ({ kind, name: name === '' ? null : name, geometry, widthM: metres(widthM) })),
      sites: sites.filter(isThere).map(({ kind, name, geometry, keepClearM, note }) => ({ kind, name, geometry, keepClearM: metres(keepClearM), note })),
    }
  })
}
