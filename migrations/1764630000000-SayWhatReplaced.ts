import type { MigrationInterface, QueryRunner } from 'typeorm'

/** The function anew, with what it answers and how. */
async function makeAnew(db: QueryRunner, answers: string, query: string): Promise<void> {
  await db.query('DROP FUNCTION find_check_code(text)')
  await db.query(
    `CREATE FUNCTION find_check_code(code text) RETURNS TABLE (${answers})
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$ ${query} $$`,
  )
  await db.query('REVOKE ALL ON FUNCTION find_check_code(text) FROM PUBLIC')
}

/** Whoever checks the code of a printed record also learns whether that version still stands. */
export class SayWhatReplaced1764630000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await makeAnew(
      db, 'number text, seq integer, version integer, signed_at timestamptz, digest text, latest integer, withdrawn boolean',
      `SELECT v.number, v.seq, v.version, v.signed_at, v.digest, last.version, last.entry = 'withdrawn'
        FROM public.record_versions v
        CROSS JOIN LATERAL (
          SELECT l.version, l.entry FROM public.record_versions l WHERE l.farm_id = v.farm_id AND l.record_id = v.record_id ORDER BY l.version DESC LIMIT 1
        ) last
        WHERE v.check_code = code`,
    )
  }

  async down(db: QueryRunner): Promise<void> {
    await makeAnew(
      db, 'number text, seq integer, version integer, signed_at timestamptz, digest text',
      'SELECT v.number, v.seq, v.version, v.signed_at, v.digest FROM public.record_versions v WHERE v.check_code = code',
    )
  }
}
