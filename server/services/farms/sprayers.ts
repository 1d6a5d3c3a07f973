import type { z } from 'zod'
import type { Page } from '../../../shared/contract/common.ts'
import type { createSprayerSchema, Sprayer as SprayerAnswer } from '../../../shared/contract/farm.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Sprayer } from '../../entities/Sprayer.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'

/** A page of the farm's sprayers and drenchers by code. */
export function listSprayers(services: Services, actor: FarmActor, page: Page): Promise<{ items: SprayerAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => listByKey(manager, Sprayer, page, actor.farmId, { key: 'code', present }))
}

/** Takes a sprayer into the farm's list. @returns the sprayer, and whether this call made it. */
export async function createSprayer(services: Services, actor: FarmActor, input: z.output<typeof createSprayerSchema>): Promise<{ made: boolean; sprayer: SprayerAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const row: Sprayer = { ...input, farmId: actor.farmId, revision: 1, creationDigest: digestOf(input), createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, Sprayer, row, { path: 'code', code: 'code.taken', params: { code: input.code } })
    if (made) await appendJournal(services, manager, actor, { action: 'sprayer.created', subjectId: input.id, detail: { code: input.code } })
    return { made, sprayer: present(stored) }
  })
}

function present({ id, code, name, tankL, flowLPerMin, revision }: Sprayer): SprayerAnswer {
  return { id, code, name, tankL, flowLPerMin, revision }
}
