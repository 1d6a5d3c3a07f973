import { v7 as uuidV7 } from 'uuid'
import type { BarePlan } from '../baselines/bareServer.ts'
import { openClient, type Client } from '../httpClient.ts'
import { assertSame, measureRounds } from '../measureRounds.ts'
import type { Field } from '../openField.ts'
import { recordStatements } from '../../support/recordStatements.ts'
import { startChild } from '../startChild.ts'
import type { Summary } from '../statistics.ts'

/** How often each side is asked, and in how many rounds. */
export interface Effort { times: number; rounds: number }

const listOf = (farmId: string): string => `/api/farms/${farmId}/records?limit=50`
const recordsOf = (farmId: string): string => `/api/farms/${farmId}/records`

/** Ours and the bare server over the same database, as the same person. */
export interface Rivals { field: Field; ours: Client; bare: Client; close(): Promise<void> }

/** Records what ours sends to the database, and starts the bare server that sends the same. */
export async function openRivals(field: Field): Promise<Rivals> {
  const agent = await field.house.as(field.farm.accounts.manager)
  const draft = field.buildDraft()
  let written: object = {}
  const plan: BarePlan = {
    list: await recordStatements(async () => agent.get(listOf(field.farm.id)).expect(200)),
    write: await recordStatements(async () => { written = (await agent.post(recordsOf(field.farm.id)).send(draft).expect(201)).body as object }),
    known: field.known, writtenId: draft.id, writtenAnswer: written,
  }
  const server = await startChild(['--import', 'tsx', 'tests/bench/baselines/bareServer.ts'], { ...field.env, BENCH_PLAN: JSON.stringify(plan) })
  const [ours, bare] = [openClient(field.server.url, field.cookies.farm), openClient(server.url, field.cookies.farm)]
  return { field, ours, bare, close: async () => { ours.close(); bare.close(); await server.stop() } }
}

/** A page of fifty of the register. */
export async function measureList({ field, ours, bare }: Rivals, { times, rounds }: Effort): Promise<Summary> {
  const path = listOf(field.farm.id)
  const itemsOf = async (client: Client): Promise<unknown> => (JSON.parse(await client.expect(200, 'GET', path)) as { items: unknown }).items
  assertSame('list', await itemsOf(ours), await itemsOf(bare))
  const side = (client: Client) => repeat(() => client.expect(200, 'GET', path))
  return measureRounds({ ours: side(ours), baseline: side(bare), times, rounds })
}

/** The same page where there are a hundred times as many records. */
export async function measureGrowth(field: Field, { times, rounds }: Effort): Promise<Summary> {
  const [large, small] = [openClient(field.server.url, field.cookies.farm), openClient(field.server.url, field.cookies.small)]
  const side = (client: Client, farmId: string) => repeat(() => client.expect(200, 'GET', listOf(farmId)))
  const lengthOf = async (client: Client, farmId: string): Promise<number> => (JSON.parse(await client.expect(200, 'GET', listOf(farmId))) as { items: unknown[] }).items.length
  assertSame('growth', await lengthOf(large, field.farm.id), await lengthOf(small, field.smallFarm.id))
  try {
    return await measureRounds({ ours: side(large, field.farm.id), baseline: side(small, field.smallFarm.id), times, rounds })
  } finally {
    large.close()
    small.close()
  }
}

/** A new draft of five components. */
export async function measureWrite({ field, ours, bare }: Rivals, { times, rounds }: Effort): Promise<Summary> {
  const write = (client: Client) => client.expect(201, 'POST', recordsOf(field.farm.id), JSON.stringify({ ...field.buildDraft(), id: uuidV7() }))
  const withoutId = (text: string): unknown => ({ ...(JSON.parse(text) as object), id: null })
  assertSame('write', withoutId(await write(ours)), withoutId(await write(bare)))
  return measureRounds({ ours: repeat(() => write(ours)), baseline: repeat(() => write(bare)), times, rounds })
}

const repeat = (work: () => Promise<unknown>) => async (times: number): Promise<void> => {
  for (let turn = 0; turn < times; turn++) await work()
}
