import type { EndedGrant } from '../../../shared/contract/grant.ts'
import type { Services } from '../services.ts'

interface Row { farm_name: string; seasons: number[]; ended_on: string; given_by: string }

/** What was granted to an account and has ended, the last to end first; farms that let it in now are left out. */
export async function listEndedGrants({ database, clock }: Pick<Services, 'clock' | 'database'>, accountId: string): Promise<EndedGrant[]> {
  const rows: Row[] = await database.askHouse('SELECT * FROM account_ended_grants($1, $2)', [accountId, clock.now()])
  return rows.map(({ farm_name: farmName, seasons, ended_on: endedOn, given_by: givenBy }) => ({ farmName, seasons, endedOn, givenBy }))
}
