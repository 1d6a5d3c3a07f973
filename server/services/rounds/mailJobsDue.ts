import { In, IsNull, type EntityManager } from 'typeorm'
import type { Job } from '../../../shared/contract/job.ts'
import { byBlock } from '../../../shared/rounds/groupBy.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import type { FarmOnRound } from '../../database/database.ts'
import { Account } from '../../entities/Account.ts'
import { Farm } from '../../entities/Farm.ts'
import { JobDigest } from '../../entities/JobDigest.ts'
import { Person } from '../../entities/Person.ts'
import { queueLetter } from '../mail/queueLetter.ts'
import type { Services } from '../services.ts'
import { readJobs } from './readJobs.ts'

/** Before this clock time on the farm nobody is told of the day. */
const FROM = '05:00'

/**
 * Tells those who lead each farm and did not choose otherwise, once a day from five in the morning there, of the jobs that are due and late.
 * Nothing due, no letter; nor of a farm to practise on.
 * Safe to run twice, and in two processes: the farm's day is marked in the transaction that queues its letters.
 * @returns how many farms had a letter, and how many letters.
 */
export async function mailJobsDue(services: Pick<Services, 'clock' | 'config' | 'database'>): Promise<{ farms: number; letters: number }> {
  const counts = { farms: 0, letters: 0 }
  for (const farm of await services.database.listFarms()) {
    const now = services.clock.now().toISOString()
    if (civilTimeIn(farm.zone, now) < FROM) continue
    const letters = await tellFarm(services, farm, civilDateIn(farm.zone, now))
    counts.letters += letters
    if (letters > 0) counts.farms += 1
  }
  return counts
}

function tellFarm(services: Pick<Services, 'clock' | 'config' | 'database'>, { farmId, farmName, zone }: FarmOnRound, today: string): Promise<number> {
  return services.database.inFarm({ farmId, seasons: null }, async (manager) => {
    if (await manager.existsBy(Farm, { id: farmId, practice: true })) return 0
    if (await manager.existsBy(JobDigest, { farmId, onDay: today })) return 0
    const { jobs } = await readJobs(manager, { farmId, zone, today })
    const due = jobs.filter(({ state }) => state === 'due')
    const late = jobs.filter(({ state }) => state === 'late')
    if (due.length + late.length === 0) return 0
    const readers = await readLeaders(manager, farmId)
    const marked = await manager.createQueryBuilder().insert().into(JobDigest)
      .values({ farmId, onDay: today, at: services.clock.now(), letters: readers.length }).orIgnore().returning('on_day').execute()
    // Another process was faster: its letters are on their way.
    if ((marked.raw as unknown[]).length === 0) return 0
    for (const { email, name, language } of readers) {
      await queueLetter(services, manager, {
        kind: 'jobsDue', farmId, to: { email, name }, language,
        params: { farm: farmName, todayOn: today, dueCount: due.length, lateCount: late.length, due: linesOf(due), late: linesOf(late) },
      })
    }
    return readers.length
  })
}

async function readLeaders(manager: EntityManager, farmId: string): Promise<(Pick<Account, 'name' | 'language'> & { email: string })[]> {
  const leaders = await manager.find(Person, { select: { accountId: true }, where: { farmId, active: true, role: In(['owner', 'manager']) } })
  const ids = leaders.flatMap(({ accountId }) => accountId ?? [])
  const accounts = await manager.find(Account, { select: { email: true, name: true, language: true, preferences: true }, where: { id: In(ids), deactivatedAt: IsNull() }, order: { email: 'ASC' } })
  // Whoever has no address signs in on a phone of the farm, and sees the jobs there.
  return accounts.flatMap(({ email, name, language, preferences }) => (email === null || preferences.jobsByMail === 'off' ? [] : [{ email, name, language }]))
}

/** A preparation and the blocks it is due on, in the order of their codes. */
function linesOf(jobs: readonly Job[]): { preparation: string; blocks: string }[] {
  const byName = new Map<string, string[]>()
  for (const { preparation, blockCode } of jobs.toSorted(byBlock)) byName.set(preparation, [...(byName.get(preparation) ?? []), blockCode])
  return [...byName].map(([preparation, codes]) => ({ preparation, blocks: codes.join(', ') }))
}
