import { randomBytes } from 'node:crypto'
import type { PoolClient } from 'pg'
import type { Recorded } from '../../support/recordStatements.ts'
import { replay, type Swap } from './replay.ts'

/** The statements that signed one record, and what was its own in them. */
export interface SignPlan { statements: Recorded[]; known: ReadonlySet<unknown>; recordId: string; digest: string }

/** Signs another draft by the same statements: nothing is worked out, its number and entry are those that the database gives. */
export async function signBare(client: PoolClient, plan: SignPlan, id: string): Promise<void> {
  const digest = randomBytes(32).toString('hex')
  const swap: Swap = new Map<unknown, unknown>([[plan.recordId, id], [plan.digest, digest], [plan.digest.slice(0, 20), digest.slice(0, 20)]])
  const given = numbersOf(plan)
  await replay(client, plan.statements, plan.known, swap, (text, [row]) => {
    if (text.startsWith('UPDATE farm_heads')) swap.set(given.seq, row?.['last_seq'])
    if (!text.startsWith('INSERT INTO season_counters')) return
    const number = Number(row?.['last_number'])
    swap.set(given.number, number)
    swap.set(`${given.season}-${given.number}`, `${given.season}-${number}`)
    swap.set(String(given.season * 10_000_000 + given.number), String(given.season * 10_000_000 + number))
  })
}

/** The numbers that the recorded run was given, as its new version carries them. */
function numbersOf({ statements }: SignPlan): { season: number; seq: number; number: number } {
  const version = statements.find(({ text }) => text.startsWith('INSERT INTO "record_versions"'))
  const columns = /\(([^)]*)\)/.exec(version?.text ?? '')?.[1]?.split(',').map((name) => name.trim().replaceAll('"', '')) ?? []
  const valueOf = (name: string): string => String(version?.params[columns.indexOf(name)])
  const [season = '', number = ''] = valueOf('number').split('-')
  return { season: Number(season), seq: Number(valueOf('seq')), number: Number(number) }
}
