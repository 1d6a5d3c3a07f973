import { expect } from 'vitest'
import type { Agent, TestFarm, TestHouse } from './openHouse.ts'

/** One row of bad input and the answer it must get. */
export interface BadRow {
  what: string
  path: string
  body: () => unknown
  /** Each field's path and code, in order; `422` throughout. */
  errors: string[]
}

const TABLES = ['blocks', 'materials', 'lots', 'lot_entries', 'sprayers', 'application_records', 'record_versions', 'journal']

/** Rows of each table of a farm and the head of its log: what a refusal must leave as it was. */
export async function stateOf({ services }: TestHouse, farmId: string): Promise<unknown> {
  const counts = TABLES.map((table) => `(SELECT count(*)::integer FROM ${table}) AS ${table}`).join(', ')
  const [state] = await services.database.inFarm({ farmId, seasons: null }, (manager) =>
    manager.query<unknown[]>(`SELECT ${counts}, (SELECT last_seq FROM farm_heads) AS head`))
  return state
}

/** Each field's path and code. */
export function faultsOf(body: { errors: { path: string; code: string }[] }): string[] {
  return body.errors.map(({ path, code }) => `${path} ${code}`)
}

/** Sends a row, and holds the answer, its words and what the farm holds against what they must be. */
export async function expectRefused(house: TestHouse, farm: TestFarm, agent: Agent, { path, body, errors }: BadRow): Promise<void> {
  const before = await stateOf(house, farm.id)
  const response = await agent.post(`/api/farms/${farm.id}${path}`).send(body() as object)
  expect([response.status, ...faultsOf(response.body)]).toEqual([422, ...errors])
  expect(response.type).toBe('application/problem+json')
  for (const { message } of response.body.errors as { message: string }[]) expect(message).toMatch(/^\p{Lu}.*[.?]$/su)
  expect(await stateOf(house, farm.id)).toEqual(before)
}
