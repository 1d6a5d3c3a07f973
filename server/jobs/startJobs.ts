import PgBoss from 'pg-boss'
import { listenFor } from '../database/listenFor.ts'
import { sendDueLetters } from '../services/mail/sendDueLetters.ts'
import type { Services } from '../services/services.ts'
import { JOBS } from './jobs.ts'
import { oneAtATime } from './oneAtATime.ts'

const STOP_MS = 10_000
const POLL_S = 10

/** Timed work in motion. */
export interface RunningJobs {
  /** Lets what is in hand be finished, at most ten seconds, and takes no more. */
  stop(): Promise<void>
}

/**
 * Starts timed work (pg-boss keeps its times, in a schema of the owner role that the app role cannot reach) and sends letters as soon as they
 * are written. @throws {Error} if the owner role may not make that schema.
 */
export async function startJobs(services: Services): Promise<RunningJobs> {
  const { logger } = services
  const boss = new PgBoss({
    connectionString: services.config.databaseOwnerUrl, schema: 'pgboss', max: 2, application_name: 'drenchleaf jobs',
    archiveCompletedAfterSeconds: 3600, deleteAfterDays: 7,
  })
  boss.on('error', (error) => logger.warn({ err: error }, 'timed work'))
  await boss.start()
  for (const { name, cron, run } of JOBS) {
    await boss.createQueue(name, { name, policy: 'short', retryLimit: 0, expireInMinutes: 15 })
    await boss.schedule(name, cron)
    await boss.work(name, { pollingIntervalSeconds: POLL_S }, async () => {
      const counts = await run(services)
      if (Object.values(counts).some((count) => count > 0)) logger.info({ job: name, ...counts }, 'timed work done')
    })
  }
  const post = openPost(services)
  return {
    stop: async () => {
      await post.close()
      await boss.stop({ graceful: true, wait: true, timeout: STOP_MS })
    },
  }
}

/** Sends at once what a transaction wrote; what a broken connection did not hear of goes when it listens again, or with the next minute. */
function openPost(services: Services): { close(): Promise<void> } {
  const { config, logger } = services
  const carry = oneAtATime(() => sendDueLetters(services), (error) => logger.error({ err: error }, 'letters'))
  let ear: { close(): Promise<void> } | null = null
  let isClosing = false
  const listen = (): void => {
    listenFor(config.databaseUrl, 'drenchleaf_letters', { heard: carry.again, ended: listenLater }).then((opened) => {
      ear = opened
      carry.again()
    }, listenLater)
  }
  const listenLater = (error: unknown): void => {
    ear = null
    if (isClosing) return
    logger.warn({ err: error }, 'nobody listens for letters')
    setTimeout(listen, POLL_S * 1000).unref()
  }
  listen()
  return {
    close: async () => {
      isClosing = true
      await ear?.close()
      await carry.idle()
    },
  }
}
