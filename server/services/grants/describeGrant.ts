import { z } from 'zod'
import { IsNull } from 'typeorm'
import type { Welcome } from '../../../shared/contract/welcome.ts'
import type { AccountToken } from '../../entities/AccountToken.ts'
import { Farm } from '../../entities/Farm.ts'
import { Grant } from '../../entities/Grant.ts'
import type { Services } from '../services.ts'

/** What a link to a first password keeps where it was sent with a grant. */
const detailSchema = z.object({ farmId: z.string(), grantId: z.string() })

/** What a link lets its holder read; null where it came with no grant, or with one that was ended. */
export async function describeGrant({ database }: Pick<Services, 'database'>, link: Pick<AccountToken, 'detail'>): Promise<Welcome['grant']> {
  const detail = detailSchema.safeParse(link.detail)
  if (!detail.success) return null
  const { farmId, grantId } = detail.data
  return database.inFarm({ farmId, seasons: null }, async (manager) => {
    const grant = await manager.findOneBy(Grant, { farmId, id: grantId, endedAt: IsNull() })
    if (grant === null) return null
    const farm = await manager.findOneByOrFail(Farm, { id: farmId })
    return { farm: farm.name, seasons: grant.seasons, endsOn: grant.endsOn }
  })
}
