import type { Services } from '../services/services.ts'

/** Timed work. `run` may be called twice for one time, and by two processes. */
export interface Job {
  /** Names its queue. */
  name: string
  /** When, by five fields of cron in UTC. */
  cron: string
  /** @returns what it did, counted, for the log. */
  run(services: Services): Promise<Record<string, number>>
}
