import pg, { type PoolClient } from 'pg'
import { createRecord } from '../../../server/services/records/createRecord.ts'
import { sealRecord } from '../../../server/services/records/sealRecord.ts'
import { assertSame, measureRounds } from '../measureRounds.ts'
import type { Field } from '../openField.ts'
import { recordStatements } from '../../support/recordStatements.ts'
import type { Summary } from '../statistics.ts'
import { signBare, type SignPlan } from '../baselines/signBare.ts'
import type { Effort } from './overHttp.ts'

/** Numbers begin here, and so many are signed before one is recorded: its number and entry are then like no other value of the statements. */
const FIRST_NUMBER = 600_000
const SIGNED_BEFORE = 40

/** Signing by the service, without the password hash, beside the same statements sent raw as the same role. */
export async function measureSign(field: Field, { times, rounds }: Effort): Promise<Summary> {
  const { services } = field.house
  const actor = await field.farm.actor('manager')
  const pool = new pg.Pool({ connectionString: services.config.databaseUrl, max: 1 })
  const client = await pool.connect()
  const drafts: string[] = []
  const nextDraft = (): string => drafts.pop() ?? ''
  const seal = (id: string) => services.database.inFarm(actor, (manager) => sealRecord(services, manager, actor, id, { acknowledged: [], revision: 1 }))
  try {
    await beginNumbers(field)
    for (let made = 0; made < times * (rounds + 2) * 3 + SIGNED_BEFORE + 3; made++) {
      const draft = field.buildDraft()
      await createRecord(services, actor, draft)
      drafts.push(draft.id)
    }
    for (let signed = 0; signed < SIGNED_BEFORE; signed++) await seal(nextDraft())
    const recordedId = nextDraft()
    let digest = ''
    const statements = await recordStatements(async () => { digest = (await seal(recordedId)).digest ?? '' })
    const plan: SignPlan = { statements, known: new Set(field.known), recordId: recordedId, digest }
    const [ours, bare] = [nextDraft(), nextDraft()]
    await seal(ours)
    await signBare(client, plan, bare)
    assertSame('sign', await signedRow(client, field.farm.id, ours), await signedRow(client, field.farm.id, bare))
    const repeat = (work: (id: string) => Promise<unknown>) => async (count: number): Promise<void> => {
      for (let turn = 0; turn < count; turn++) await work(nextDraft())
    }
    return await measureRounds({ ours: repeat(seal), baseline: repeat((id) => signBare(client, plan, id)), times, rounds })
  } finally {
    client.release()
    await pool.end()
  }
}

async function beginNumbers(field: Field): Promise<void> {
  const owner = new pg.Client({ connectionString: field.house.ownerUrl })
  await owner.connect()
  await owner.query("SELECT set_config('app.farm_id', $1, false)", [field.farm.id])
  await owner.query(
    `INSERT INTO season_counters (farm_id, season, last_number) VALUES ($1, 2026, $2) ON CONFLICT (farm_id, season) DO UPDATE SET last_number = excluded.last_number`,
    [field.farm.id, FIRST_NUMBER],
  )
  await owner.end()
}

/** What signing left of a record, but for what tells two records apart, and how much of all that finds it. */
async function signedRow(client: PoolClient, farmId: string, id: string): Promise<unknown> {
  await client.query('BEGIN')
  await client.query("SELECT set_config('app.farm_id', $1, true), set_config('app.seasons', '', true), set_config('app.role', 'manager', true)", [farmId])
  const { rows } = await client.query(
    `SELECT r.state, r.content, r.computed, r.checks, r.version, r.revision, r.season, r.signed_by_id,
       (SELECT count(*)::integer FROM record_versions v WHERE v.farm_id = r.farm_id AND v.record_id = r.id) AS versions,
       (SELECT count(*)::integer FROM lot_entries e WHERE e.farm_id = r.farm_id AND e.record_id = r.id) AS draws,
       (SELECT count(*)::integer FROM record_components c WHERE c.farm_id = r.farm_id AND c.record_id = r.id) AS components,
       (SELECT count(*)::integer FROM journal j WHERE j.farm_id = r.farm_id AND j.subject_id = r.id AND j.action = 'record.signed') AS entries
     FROM application_records r WHERE r.farm_id = $1 AND r.id = $2`,
    [farmId, id],
  )
  await client.query('COMMIT')
  return rows[0]
}
