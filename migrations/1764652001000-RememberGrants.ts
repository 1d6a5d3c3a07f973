import type { MigrationInterface, QueryRunner } from 'typeorm'

/** What was granted to an account and is not any more: which farm, which seasons, until when, and who gave it. Its own alone. */
export class RememberGrants1764652001000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`CREATE FUNCTION account_ended_grants(account uuid, at timestamptz)
      RETURNS TABLE (farm_name text, seasons integer[], ended_on text, given_by text)
      LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
        SELECT f.name, g.seasons, least(g.ends_on, (g.ended_at AT TIME ZONE f.zone)::date)::text, coalesce(p.name, '')
          FROM public.grants g JOIN public.farms f ON f.id = g.farm_id LEFT JOIN public.people p ON p.farm_id = g.farm_id AND p.id = g.given_by_id
          WHERE g.account_id = account AND (g.ended_at IS NOT NULL OR (at AT TIME ZONE f.zone)::date > g.ends_on)
            AND NOT EXISTS (SELECT 1 FROM public.grants s WHERE s.farm_id = g.farm_id AND s.account_id = account AND s.ended_at IS NULL AND (at AT TIME ZONE f.zone)::date <= s.ends_on)
          ORDER BY 3 DESC, 1 LIMIT 50 $$`)
    await db.query('REVOKE ALL ON FUNCTION account_ended_grants(uuid, timestamptz) FROM PUBLIC')
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP FUNCTION account_ended_grants(uuid, timestamptz)')
  }
}
