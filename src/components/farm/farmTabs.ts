import type { Role } from '../../../shared/contract/session.ts'

/** One sub-place of the Farm place: its route, the message of its word, and who may open it. */
export interface FarmTab {
  route: string
  words: string
  roles: readonly Role[]
}

const FARM_PEOPLE: readonly Role[] = ['owner', 'manager', 'applicator']

/** The sub-places of Farm, in the order they stand; a new one adds its line here and its route. */
export const farmTabs: readonly FarmTab[] = [
  { route: 'farm', words: 'farm.profile', roles: FARM_PEOPLE },
  { route: 'farm-people', words: 'farm.people', roles: FARM_PEOPLE },
  { route: 'farm-sprayers', words: 'farm.sprayers', roles: FARM_PEOPLE },
  { route: 'farm-grants', words: 'grants.title', roles: ['owner'] },
  { route: 'farm-journal', words: 'journal.title', roles: ['owner', 'manager'] },
  { route: 'farm-mail', words: 'letters.tab', roles: ['owner'] },
]
