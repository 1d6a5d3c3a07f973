import type { FarmActor } from '../../database/actor.ts'
import { invalid } from '../../errors.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import type { Services } from '../services.ts'

/** A grant that nobody remembers is worse than one that is given anew. */
const MOST_YEARS = 5

/** @throws {AppError} `grant.past` for a last day that is over, `grant.too_long` for one more than five years ahead. */
export function assertLastDay(services: Pick<Services, 'clock'>, actor: Pick<FarmActor, 'zone'>, endsOn: string): void {
  const today = farmToday(services, actor)
  if (endsOn < today) throw invalid([{ path: 'endsOn', code: 'grant.past' }])
  if (Number(endsOn.slice(0, 4)) > Number(today.slice(0, 4)) + MOST_YEARS) throw invalid([{ path: 'endsOn', code: 'grant.too_long', params: { years: MOST_YEARS } }])
}
