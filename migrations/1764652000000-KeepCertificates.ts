import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
const WRITE = `${FARM} AND nullif(current_setting('app.seasons', true), '') IS NULL`

/** Certificates stand as dated rows: papers of an earlier season name the one that ran then. */
export class KeepCertificates1764652000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`CREATE TABLE certificates (
      farm_id uuid NOT NULL, id uuid NOT NULL, number text NOT NULL, body text NOT NULL, scope text, valid_from date, valid_until date,
      withdrawn_at timestamptz, withdrawn_reason text, revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
      CONSTRAINT certificates_pkey PRIMARY KEY (farm_id, id),
      CONSTRAINT certificates_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
      CONSTRAINT certificates_days_check CHECK (valid_until >= valid_from),
      CONSTRAINT certificates_withdrawn_check CHECK ((withdrawn_at IS NULL) = (withdrawn_reason IS NULL)))`)
    // Under the id of the farm, which its papers were handed in under.
    await db.query(`INSERT INTO certificates (farm_id, id, number, body, scope, valid_from, valid_until, creation_digest, created_at)
      SELECT id, id, certificate->>'number', certificate->>'body', certificate->>'scope', (certificate->>'issuedOn')::date, (certificate->>'expiresOn')::date, '', now()
        FROM farms WHERE certificate IS NOT NULL`)
    await db.query('ALTER TABLE farms DROP COLUMN certificate')
    await db.query('ALTER TABLE certificates ENABLE ROW LEVEL SECURITY')
    await db.query('ALTER TABLE certificates FORCE ROW LEVEL SECURITY')
    // A certifier reads them: they stand on every page that a grant opens.
    await db.query(`CREATE POLICY certificates_read ON certificates FOR SELECT USING (${FARM})`)
    await db.query(`CREATE POLICY certificates_insert ON certificates FOR INSERT WITH CHECK (${WRITE})`)
    await db.query(`CREATE POLICY certificates_update ON certificates FOR UPDATE USING (${WRITE}) WITH CHECK (${WRITE})`)
  }

  /** A farm keeps its newest. */
  async down(db: QueryRunner): Promise<void> {
    await db.query('ALTER TABLE farms ADD COLUMN certificate jsonb')
    for (const table of ['farms', 'certificates']) await db.query(`ALTER TABLE ${table} NO FORCE ROW LEVEL SECURITY`)
    await db.query(`UPDATE farms f SET certificate = (
      SELECT jsonb_build_object('number', c.number, 'body', c.body, 'scope', c.scope, 'issuedOn', c.valid_from, 'expiresOn', c.valid_until)
        FROM certificates c WHERE c.farm_id = f.id AND c.withdrawn_at IS NULL ORDER BY c.valid_from DESC NULLS LAST, c.created_at DESC LIMIT 1)`)
    await db.query('ALTER TABLE farms FORCE ROW LEVEL SECURITY')
    await db.query('DROP TABLE certificates')
  }
}
