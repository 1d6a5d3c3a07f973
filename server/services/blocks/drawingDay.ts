import { civilDateIn } from '../../../shared/time/civilDate.ts'
import type { FarmActor } from '../../database/actor.ts'
import { invalid } from '../../errors.ts'
import type { Services } from '../services.ts'

/** Today on the farm. */
export function farmToday({ clock }: Pick<Services, 'clock'>, { zone }: Pick<FarmActor, 'zone'>): string {
  return civilDateIn(zone, clock.now().toISOString())
}

/** The day an outline was drawn: today on the farm where none was sent. @throws {AppError} `time.future`. */
export function drawingDay(services: Pick<Services, 'clock'>, actor: Pick<FarmActor, 'zone'>, sent: string | undefined): string {
  const today = farmToday(services, actor)
  if (sent !== undefined && sent > today) throw invalid([{ path: 'drawnOn', code: 'time.future' }])
  return sent ?? today
}
