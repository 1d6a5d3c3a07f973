import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Signed records are found by whether somebody has read the version that stands. */
export class FindUnreviewed1764646000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await overFarms(db, `
      INSERT INTO record_terms (farm_id, record_id, term, season, work_season, sort_at)
      SELECT t.farm_id, t.record_id, CASE WHEN EXISTS (
          SELECT 1 FROM record_reviews v WHERE v.farm_id = r.farm_id AND v.record_id = r.id AND v.version = r.version
        ) THEN 'r:done' ELSE 'r:waiting' END, t.season, t.work_season, t.sort_at
      FROM record_terms t JOIN application_records r ON r.farm_id = t.farm_id AND r.id = t.record_id
      WHERE t.term = 's:signed'`)
  }

  async down(db: QueryRunner): Promise<void> {
    await overFarms(db, "DELETE FROM record_terms WHERE term LIKE 'r:%'")
  }
}

/** The owner of the tables sees no farm's rows either, save while this lifts it. */
async function overFarms(db: QueryRunner, statement: string): Promise<void> {
  const tables = ['record_terms', 'application_records', 'record_reviews']
  for (const table of tables) await db.query(`ALTER TABLE ${table} NO FORCE ROW LEVEL SECURITY`)
  await db.query(statement)
  for (const table of tables) await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
}
