import { z } from 'zod'
import type { Job, JobQuery, SeasonSheet, SheetQuery } from '../../../shared/contract/job.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Planting } from '../../entities/Planting.ts'
import { cutPage, decodeCursor } from '../cursor.ts'
import type { Services } from '../services.ts'
import { readJobs, type RoundsAt } from './readJobs.ts'
import { readWorks } from './readWorks.ts'

/** Where the farm stands today. */
export function roundsNow({ clock }: Pick<Services, 'clock'>, { farmId, zone }: Pick<FarmActor, 'farmId' | 'zone'>): RoundsAt {
  return { farmId, zone, today: civilDateIn(zone, clock.now().toISOString()) }
}

/** Day, block and number put a job in its place; the text sorts as they do. */
const placeOf = (job: Job): string => `${dayOf(job)} ${job.blockCode} ${String(job.number).padStart(4, '0')} ${job.blockId}`
/** The day a job was done, else the day it is to be done. */
const dayOf = ({ done, plannedOn }: Job): string => done?.on ?? plannedOn
const comesBefore = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)

/** A page of jobs by their day, then block: those of a window, of a state, of a block or a plan. */
export function listJobs(services: Services, actor: FarmActor, { from, to, state, blockId, planId, ...page }: JobQuery): Promise<{ items: Job[]; next: string | null }> {
  const after = decodeCursor(page.cursor, z.string().max(400))
  return services.database.inFarm(actor, async (manager) => {
    const { jobs } = await readJobs(manager, roundsNow(services, actor), blockId === undefined ? {} : { blockId })
    const rows = jobs
      .filter((job) => (from === undefined || dayOf(job) >= from) && (to === undefined || dayOf(job) <= to))
      .filter((job) => state === undefined || job.state === state || (state === 'waiting' && (job.state === 'due' || job.state === 'late')))
      .filter((job) => planId === undefined || job.planId === planId)
      .map((job) => ({ job, place: placeOf(job) }))
      .sort((a, b) => comesBefore(a.place, b.place) || comesBefore(a.job.stepId, b.job.stepId))
      .filter(({ job, place }) => after === null || (comesBefore(place, after.key) || comesBefore(job.stepId, after.id)) > 0)
    return cutPage(rows.slice(0, page.limit + 1), page.limit, ({ job }) => job, ({ job, place }) => [place, job.stepId])
  })
}

/** All that the season sheet draws between two days. */
export function readSheet(services: Services, actor: FarmActor, { from, to }: SheetQuery): Promise<SeasonSheet> {
  const at = roundsNow(services, actor)
  return services.database.inFarm(actor, async (manager) => {
    const { jobs } = await readJobs(manager, at)
    const works = await readWorks(manager, at, { from, to })
    const plantings = await manager.find(Planting, { select: { blockId: true, harvests: true, removedOn: true }, where: { farmId: actor.farmId } })
    const meets = (first: string, last: string): boolean => first <= to && last >= from
    return {
      today: at.today, from, to,
      jobs: jobs.filter(({ earliestOn, latestOn, plannedOn, done }) => meets(earliestOn, latestOn) || meets(plannedOn, plannedOn) || (done !== null && meets(done.on, done.on))),
      works: works.filter(({ on, pickFrom }) => meets(on, on) || (pickFrom !== null && meets(on, addDays(pickFrom, -1)))).map(({ materialIds: _ids, isWithdrawn: _state, ...work }) => work),
      harvests: plantings.filter(({ removedOn }) => removedOn === null)
        .flatMap(({ blockId, harvests }) => harvests.filter((harvest) => meets(harvest.from, harvest.to)).map((harvest) => ({ blockId, from: harvest.from, to: harvest.to }))),
    }
  })
}
