import type { EntityManager } from 'typeorm'

/**
 * The next entry of the farm's log and the next number of a season. The farm's head row stays locked until the
 * transaction ends, so neither has gaps: what is rolled back gives its number back.
 */
export async function takeNumber(manager: EntityManager, farmId: string, season: number): Promise<{ number: number; seq: number }> {
  const seq = await takeSeq(manager, farmId)
  const [counter]: [{ last_number: number }] = await manager.query(
    `INSERT INTO season_counters (farm_id, season, last_number) VALUES ($1, $2, 1)
     ON CONFLICT (farm_id, season) DO UPDATE SET last_number = season_counters.last_number + 1 RETURNING last_number`,
    [farmId, season],
  )
  return { number: counter.last_number, seq }
}

/** The next entry of the farm's log alone, for a version of a record that has its number. */
export async function takeSeq(manager: EntityManager, farmId: string): Promise<number> {
  const [[head]]: [[{ last_seq: number }]] = await manager.query(
    'UPDATE farm_heads SET last_seq = last_seq + 1 WHERE farm_id = $1 RETURNING last_seq',
    [farmId],
  )
  return head.last_seq
}
