import { defineStore } from 'pinia'
import { computed, ref, shallowReactive, shallowRef } from 'vue'
import { sendCommand } from '../api/commandApi.ts'
import type { Command, CommandAnswers, CommandKind } from '../api/commandTypes.ts'
import { ApiError, NetworkError } from '../api/errors.ts'
import { now } from '../plugins/clock.ts'
import { device } from '../plugins/device.ts'
import { refreshAfter } from './refreshAfter.ts'
import type { KeptCommand } from './keptCommand.ts'
import { useSession } from './session.ts'

/** What became of a command: answered, or kept on this device until there is signal. */
export type Submitted<Answer> = { state: 'sent'; answer: Answer } | { state: 'kept' }

const RETRY_MS = 30_000

/** The one write path: every command is on this device before it is sent, and leaves it when it is answered. */
export const useOutbox = defineStore('outbox', () => {
  const session = useSession()
  const items = shallowRef<KeptCommand[]>([])
  const lastSentAt = ref<string | null>(null)
  /** What was answered last: others may wait for it. */
  const lastSent = shallowRef<Pick<Command, 'kind' | 'id'> | null>(null)
  const online = ref(navigator.onLine)
  const sendingCount = ref(0)
  let flushing: Promise<void> | null = null
  /** Keys that are being sent at this moment: a retry in between leaves them alone. */
  const inHand = new Set<string>()
  /** Keys whose first sending has not ended: nobody knows yet whether they will have to wait. */
  const firstTries = shallowReactive(new Set<string>())

  const mine = computed(() => items.value.filter((item) => item.accountId === session.user?.id))
  const kept = computed(() => mine.value.filter((item) => item.state !== 'needsYou'))
  /** What was tried and waits for signal. */
  const waiting = computed(() => kept.value.filter(({ key }) => !firstTries.has(key)))
  const needsYou = computed(() => mine.value.filter((item) => item.state === 'needsYou'))

  async function refresh(): Promise<void> {
    const kept = await device.outbox.all().catch(() => [])
    items.value = kept.sort((one, other) => one.keptAt.localeCompare(other.keptAt))
  }

  /**
   * Writes the command down, sends it, and forgets it when it is answered.
   * @throws {ApiError} when the server refused it, {NetworkError} for what carries a password and could not be sent.
   */
  async function submit<Kind extends CommandKind>(command: Command<Kind>): Promise<Submitted<CommandAnswers[Kind]>> {
    // A password is never written to the device.
    if ('password' in command.body) return { state: 'sent', answer: await sendAndSettle(command) }
    const item = keep(command)
    inHand.add(item.key)
    firstTries.add(item.key)
    try {
      await device.outbox.put(item)
      await refresh()
      if (await waitsBehindAnother(item)) return { state: 'kept' }
      const answer = await sendAndSettle(command)
      await device.outbox.delete(item.key)
      return { state: 'sent', answer }
    } catch (error) {
      if (mustWait(error)) return { state: 'kept' }
      await device.outbox.delete(item.key)
      // Somebody else was first: the page behind shows theirs from now on. An outline is chosen between the two where it is drawn.
      if (error instanceof ApiError && error.problem.code === 'stale' && command.kind !== 'block.update') refreshAfter(command)
      throw error
    } finally {
      inHand.delete(item.key)
      await refresh()
      firstTries.delete(item.key)
    }
  }

  /** A command about the same thing is still here: it goes first. */
  async function waitsBehindAnother(item: KeptCommand): Promise<boolean> {
    const before = kept.value.filter((each) => each.key !== item.key && each.command.id === item.command.id)
    if (before.length === 0) return false
    await flush()
    return kept.value.some((each) => each.key !== item.key && each.command.id === item.command.id)
  }

  function keep(command: object): KeptCommand {
    const plain = JSON.parse(JSON.stringify(command)) as Command
    return {
      key: keyOf(plain),
      accountId: session.user?.id ?? '',
      command: plain,
      keptAt: now().toISOString(),
      state: 'kept',
      problem: null,
    }
  }

  async function sendAndSettle<Kind extends CommandKind>(command: Command<Kind>): Promise<CommandAnswers[Kind]> {
    sendingCount.value += 1
    try {
      const answer = await sendCommand(command)
      lastSentAt.value = now().toISOString()
      lastSent.value = { kind: command.kind, id: command.id }
      refreshAfter(command)
      return answer
    } finally {
      sendingCount.value -= 1
    }
  }

  /** Sends what is kept, oldest first; stops at the first that finds no signal. */
  function flush(): Promise<void> {
    flushing ??= sendKept().finally(() => { flushing = null })
    return flushing
  }

  async function sendKept(): Promise<void> {
    await refresh()
    for (const item of kept.value.filter((each) => !inHand.has(each.key))) {
      inHand.add(item.key)
      try {
        await sendAndSettle(item.command)
        await device.outbox.delete(item.key)
        // What was sent is not said to wait while others still do.
        await refresh()
      } catch (error) {
        if (mustWait(error)) break
        if (!(error instanceof ApiError)) throw error
        await turn(item.key, { state: 'needsYou', problem: error.problem })
      } finally {
        inHand.delete(item.key)
      }
    }
    await refresh()
  }

  /** Gives up one command: a person said so. */
  async function discard(key: string): Promise<void> {
    await device.outbox.delete(key)
    await refresh()
  }

  /** Puts a refused command back in line. */
  async function retry(key: string): Promise<void> {
    await turn(key, { state: 'kept', problem: null })
    await flush()
  }

  /** Begins to watch for signal; call once, when the app starts. */
  function start(): void {
    const attempt = (): void => { online.value = navigator.onLine; if (kept.value.length > 0) void flush() }
    window.addEventListener('online', attempt)
    window.addEventListener('offline', attempt)
    window.addEventListener('focus', attempt)
    window.setInterval(attempt, RETRY_MS)
    void refresh().then(attempt)
  }

  return { items: mine, kept, waiting, needsYou, sendingCount, lastSentAt, lastSent, online, submit, flush, discard, retry, start }
})

/** A second write of the same thing replaces the first that was not sent; two counts of a lot are two. */
function keyOf(command: Command): string {
  return `${command.kind}:${command.kind === 'lot.count' ? command.body.id : command.id}`
}

async function turn(key: string, change: Pick<KeptCommand, 'state' | 'problem'>): Promise<void> {
  await device.outbox.change(key, (before) => before && { ...before, ...change })
}

/** No signal, no session, too many or a server in trouble: nothing was decided, so it stays. */
export function mustWait(error: unknown): boolean {
  if (error instanceof NetworkError) return true
  return error instanceof ApiError && (error.problem.status >= 500 || [401, 429].includes(error.problem.status))
}
