import { sessionSchema, type Session } from '../../shared/contract/session.ts'
import { now } from '../plugins/clock.ts'
import { device } from '../plugins/device.ts'

const SESSION_KEY = 'session'

/** Keeps one answer for its account; a device that refuses storage goes on without it. */
export async function keepRead(key: string, accountId: string, answer: unknown): Promise<void> {
  await device.reads.put({ key, accountId, answer, readAt: now().toISOString() }).catch(() => undefined)
}

/** The answer kept under a key for this account, or undefined. */
export async function keptRead(key: string, accountId: string): Promise<unknown> {
  const kept = await device.reads.get(key).catch(() => undefined)
  return kept !== undefined && kept.accountId === accountId ? kept.answer : undefined
}

/** Keeps who is signed in, so that the next start without signal opens as the same person. */
export async function keepSession(session: Session): Promise<void> {
  await keepRead(SESSION_KEY, session.user.id, session)
}

/** Who was signed in last on this device, or null. */
export async function keptSession(): Promise<Session | null> {
  const kept = await device.reads.get(SESSION_KEY).catch(() => undefined)
  const read = sessionSchema.safeParse(kept?.answer)
  return read.success ? read.data : null
}

/** Wipes every kept answer; drafts and commands are not touched. */
export async function forgetReads(): Promise<void> {
  await device.reads.clear().catch(() => undefined)
}
