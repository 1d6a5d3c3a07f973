import type { MigrationInterface, QueryRunner } from 'typeorm'

/** The code of a season report is found like that of a record: by whoever holds the paper. */
export class FindSeasonCode1764648000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query('CREATE INDEX season_heads_code_idx ON season_heads ("left"(digest, 20))')
    await db.query('CREATE POLICY season_heads_owner_reads ON season_heads FOR SELECT TO CURRENT_USER USING (true)')
    await db.query(
      `CREATE FUNCTION find_season_code(code text) RETURNS TABLE (farm_id uuid, season integer, seq integer, digest text, taken_at timestamptz)
        LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
          SELECT h.farm_id, h.season, h.seq, h.digest, h.taken_at FROM public.season_heads h
            WHERE "left"(h.digest, 20) = code ORDER BY h.taken_at LIMIT 1 $$`,
    )
    await db.query('REVOKE ALL ON FUNCTION find_season_code(text) FROM PUBLIC')
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP FUNCTION find_season_code(text)')
    await db.query('DROP POLICY season_heads_owner_reads ON season_heads')
    await db.query('DROP INDEX season_heads_code_idx')
  }
}
