import type { ChangeSite, CreateSite, Site as SiteAnswer } from '../../../shared/contract/ground.ts'
import type { Page } from '../../../shared/contract/common.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Site } from '../../entities/Site.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { changeRow } from './changeRow.ts'
import { readGeometry } from './readGeometry.ts'

/** A page of the farm's sites to keep clear of, by name; those that ended too. */
export function listSites(services: Services, actor: FarmActor, page: Page): Promise<{ items: SiteAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => listByKey(manager, Site, page, actor.farmId, { key: 'name', present: presentSite }))
}

/** Writes a site down. @returns the site, and whether this call made it. @throws {AppError} for an impossible geometry. */
export async function createSite(services: Services, actor: FarmActor, input: CreateSite): Promise<{ made: boolean; site: SiteAnswer }> {
  const geometry = readGeometry(input.geometry)
  return services.database.inFarm(actor, async (manager) => {
    const row: Site = { ...input, geometry, farmId: actor.farmId, revision: 1, creationDigest: digestOf({ ...input, geometry }), createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, Site, row, { path: 'id', code: 'conflict' })
    if (made) await appendJournal(services, manager, actor, { action: 'site.created', subjectId: input.id, detail: { name: input.name, kind: input.kind, keepClearM: input.keepClearM } })
    return { made, site: presentSite(stored) }
  })
}

/** Changes or ends a site. @throws {AppError} not-found, `stale`, or for an impossible geometry. */
export async function changeSite(services: Services, actor: FarmActor, id: string, { revision, geometry, ...facts }: ChangeSite): Promise<SiteAnswer> {
  const changes = { ...facts, ...(geometry !== undefined && { geometry: readGeometry(geometry) }) } as Partial<Site>
  return services.database.inFarm(actor, async (manager) =>
    presentSite(await changeRow({ services, manager, actor }, { target: Site, id, revision, changes, action: 'site.changed', present: presentSite })))
}

function presentSite({ id, kind, name, geometry, keepClearM, note, endedOn, revision, createdAt }: Site): SiteAnswer {
  return { id, kind, name, geometry, keepClearM, note, endedOn, revision, createdAt: createdAt.toISOString() }
}
