import type { Role } from '../../shared/contract/session.ts'

/** A signed-in account on one farm, as the database said at the start of this request. */
export interface FarmActor {
  accountId: string
  farmId: string
  farmName: string
  /** IANA zone of the farm. */
  zone: string
  /** MM-DD. */
  seasonStart: string
  role: Role
  /** Null for a certifier, who is no person of the farm. */
  personId: string | null
  personName: string | null
  /** Seasons that may be read; null for the farm's own people. */
  seasons: number[] | null
  /** Where the request came from, as far as it is kept; null for what no request asked for. */
  origin: Origin | null
  /** What is asked when the account signs something. */
  signsWith: 'password' | 'pin'
  /** Whether this role on this farm needs a second factor. */
  asksFactor: boolean
}

/** From where: the network without its last part, and the names of browser and system. */
export interface Origin { network: string | null; device: string | null }

/** The person id of somebody who writes; a certifier never does. @throws {Error} for a certifier. */
export function personOf(actor: FarmActor): string {
  if (actor.personId === null) throw new Error('A certifier writes nothing')
  return actor.personId
}
