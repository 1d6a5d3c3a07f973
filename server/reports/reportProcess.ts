import { once } from 'node:events'
import type { ChildProcess } from 'node:child_process'
import { Readable } from 'node:stream'
import type { ReportJob } from './renderReport.ts'
import type { WorkerAnswer, WorkerOrder } from './reportMessages.ts'
import { startWorker } from './startWorker.ts'

/** Draws documents outside the server's own process. */
export interface ReportProcess {
  /** The document's bytes; the stream fails with an Error if it cannot be drawn or takes longer than the limit. */
  render(job: ReportJob): Readable
  /** Fails what waits or runs, and ends the drawing processes. */
  close(): Promise<void>
}

/** A volume of a register has up to 150 pages, on a machine that has other work. */
const PATIENCE: Record<ReportJob['kind'], number> = { record: 1, register: 6, season: 6, sheets: 6, farmMap: 2, blankRecord: 1 }

interface Options { workers?: number; limitMs?: number; start?: () => ChildProcess }
interface Order { id: number; job: ReportJob; stream: Readable }
interface Slot { child: ChildProcess | null; order: Order | null; timer: NodeJS.Timeout | null }

/**
 * A pool of drawing processes, each with one job at a time, so that one that dies or hangs takes no other job with it. The first is
 * started at once and kept warm, the second when both are needed, and a lost one with the next job; jobs beyond that wait in turn.
 * @param limitMs milliseconds a record may take once it is being drawn; a register may take six times as long.
 */
export function createReportProcess({ workers = 2, limitMs = 30_000, start = startWorker }: Options = {}): ReportProcess {
  return new ReportPool({ workers, limitMs, start })
}

class ReportPool implements ReportProcess {
  private readonly slots: Slot[]
  private readonly waiting: Order[] = []
  private nextId = 1
  private isClosed = false

  constructor(private readonly options: Required<Options>) {
    this.slots = Array.from({ length: options.workers }, () => ({ child: null, order: null, timer: null }))
    const [first] = this.slots
    if (first) this.startIn(first)
  }

  render(job: ReportJob): Readable {
    const stream = new Readable({ read: () => undefined })
    if (this.isClosed) return stream.destroy(closed())
    this.waiting.push({ id: this.nextId, job, stream })
    this.nextId += 1
    this.next()
    return stream
  }

  async close(): Promise<void> {
    this.isClosed = true
    for (const { stream } of this.waiting.splice(0)) stream.destroy(closed())
    await Promise.all(this.slots.map(async (slot) => {
      release(slot)?.stream.destroy(closed())
      const { child } = slot
      slot.child = null
      if (!child || child.exitCode !== null || child.signalCode !== null) return
      const gone = once(child, 'exit')
      child.kill('SIGKILL')
      await gone
    }))
  }

  private startIn(slot: Slot): ChildProcess {
    const child = this.options.start()
    slot.child = child
    child.on('message', (answer: WorkerAnswer) => this.hear(slot, answer))
    child.on('error', (error) => this.lose(slot, child, error.message))
    child.on('exit', (code, signal) => this.lose(slot, child, `it ended with ${signal ?? code}`))
    return child
  }

  /** Gives the next job to a slot that is free, a warm one first. */
  private next(): void {
    const free = this.slots.filter(({ order }) => order === null)
    const slot = free.find(({ child }) => child !== null) ?? free[0]
    if (this.isClosed || !slot) return
    const order = this.waiting.shift()
    if (!order) return
    if (order.stream.destroyed) return this.next()
    slot.order = order
    this.startTimer(slot)
    const child = slot.child ?? this.startIn(slot)
    child.send({ id: order.id, job: order.job } satisfies WorkerOrder, (error) => {
      if (error) this.lose(slot, child, error.message)
    })
  }

  private hear(slot: Slot, answer: WorkerAnswer): void {
    const { order } = slot
    // A process that had to start first gets its job's whole time from here.
    if (answer.kind === 'ready') return this.startTimer(slot)
    if (order?.id !== answer.id) return
    if (answer.kind === 'chunk') {
      if (!order.stream.destroyed) order.stream.push(answer.bytes)
      return
    }
    release(slot)
    if (answer.kind === 'failed') order.stream.destroy(new Error(`The document could not be drawn: ${answer.message}`))
    else if (!order.stream.destroyed) order.stream.push(null)
    this.next()
  }

  private startTimer(slot: Slot): void {
    if (slot.timer) clearTimeout(slot.timer)
    slot.timer = slot.order && setTimeout(() => this.giveUp(slot), this.limitOf(slot.order))
  }

  private limitOf(order: Order | null): number {
    return this.options.limitMs * (order === null ? 1 : PATIENCE[order.job.kind])
  }

  private lose(slot: Slot, child: ChildProcess, why: string): void {
    if (slot.child !== child) return
    slot.child = null
    release(slot)?.stream.destroy(new Error(`The drawing process was lost: ${why}.`))
    this.next()
  }

  private giveUp(slot: Slot): void {
    const { child, order } = slot
    slot.child = null
    release(slot)?.stream.destroy(new Error(`The document took longer than ${this.limitOf(order) / 1000} s.`))
    child?.kill('SIGKILL')
    this.next()
  }
}

function closed(): Error {
  return new Error('The drawing process is closed.')
}

/** Frees a slot; returns the job it had. */
function release(slot: Slot): Order | null {
  const { order, timer } = slot
  if (timer) clearTimeout(timer)
  slot.order = null
  slot.timer = null
  return order
}
