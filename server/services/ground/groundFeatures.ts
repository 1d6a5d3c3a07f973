import type { ChangeGround, CreateGround, GroundFeature as GroundAnswer } from '../../../shared/contract/ground.ts'
import type { Page } from '../../../shared/contract/common.ts'
import { groundFault } from '../../../shared/geo/groundFault.ts'
import type { FarmActor } from '../../database/actor.ts'
import { GroundFeature } from '../../entities/GroundFeature.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { changeRow } from './changeRow.ts'
import { readGeometry } from './readGeometry.ts'

/** A page of the farm's own ground plan, by name; what ended too. */
export function listGround(services: Services, actor: FarmActor, page: Page): Promise<{ items: GroundAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => listByKey(manager, GroundFeature, page, actor.farmId, { key: 'name', present: presentGround }))
}

/** Draws a piece of the ground plan. @returns it, and whether this call made it. @throws {AppError} for what its kind cannot be. */
export async function createGround(services: Services, actor: FarmActor, input: CreateGround): Promise<{ made: boolean; feature: GroundAnswer }> {
  const geometry = readGeometry(input.geometry)
  const row: GroundFeature = {
    ...input, geometry, name: input.name ?? '', farmId: actor.farmId, revision: 1, creationDigest: digestOf({ ...input, geometry }), createdAt: services.clock.now(),
  }
  assertFits(row)
  return services.database.inFarm(actor, async (manager) => {
    const { made, stored } = await insertOnce(manager, GroundFeature, row, { path: 'id', code: 'conflict' })
    if (made) await appendJournal(services, manager, actor, { action: 'ground.created', subjectId: input.id, detail: { name: input.name, kind: input.kind } })
    return { made, feature: presentGround(stored) }
  })
}

/** Changes or ends a piece of the ground plan. @throws {AppError} not-found, `stale`, or for what its kind cannot be. */
export async function changeGround(services: Services, actor: FarmActor, id: string, { revision, geometry, name, ...facts }: ChangeGround): Promise<GroundAnswer> {
  const changes = {
    ...facts, ...(geometry !== undefined && { geometry: readGeometry(geometry) }), ...(name !== undefined && { name: name ?? '' }),
  } as Partial<GroundFeature>
  return services.database.inFarm(actor, async (manager) =>
    presentGround(await changeRow({ services, manager, actor }, { target: GroundFeature, id, revision, changes, action: 'ground.changed', present: presentGround, judge: assertFits })))
}

function assertFits(row: GroundFeature): void {
  const fault = groundFault(row)
  if (fault !== null) throw invalid([fault])
}

function presentGround({ id, kind, name, geometry, widthM, endedOn, revision, createdAt }: GroundFeature): GroundAnswer {
  return { id, kind, name: name === '' ? null : name, geometry, widthM, endedOn, revision, createdAt: createdAt.toISOString() }
}
