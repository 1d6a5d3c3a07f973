import { v7 } from 'uuid'
import { now } from '../../plugins/clock.ts'

/** A new id (UUIDv7) made on this device. */
export function newId(): string {
  return v7({ msecs: now().getTime() })
}
