import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
const OWN = `farm_id = ${FARM} AND nullif(current_setting('app.seasons', true), '') IS NULL`

/** People are invited onto a farm by letter; a one-time link says what it is about; asking for a new password is counted. */
export class AddInvitations1764640001000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of STATEMENTS) await db.query(statement)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP TABLE reset_asks')
    await db.query('DROP TABLE invitations')
    await db.query('ALTER TABLE account_tokens DROP COLUMN detail')
  }
}

const STATEMENTS = [
  "ALTER TABLE account_tokens ADD COLUMN detail jsonb NOT NULL DEFAULT '{}'",
  `CREATE TABLE invitations (
    farm_id uuid NOT NULL, id uuid NOT NULL, account_id uuid NOT NULL, email text NOT NULL, name text, role text NOT NULL, language text NOT NULL,
    invited_by_id uuid NOT NULL, created_at timestamptz NOT NULL, sent_at timestamptz NOT NULL, expires_at timestamptz NOT NULL,
    accepted_at timestamptz, withdrawn_at timestamptz, revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL,
    CONSTRAINT invitations_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT invitations_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT invitations_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id),
    CONSTRAINT invitations_invited_by_fkey FOREIGN KEY (farm_id, invited_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT invitations_role_check CHECK (role IN ('owner', 'manager', 'applicator')),
    CONSTRAINT invitations_language_check CHECK (language IN ('en', 'es')))`,
  `CREATE UNIQUE INDEX invitations_open_key ON invitations (farm_id, account_id) WHERE accepted_at IS NULL AND withdrawn_at IS NULL`,
  'ALTER TABLE invitations ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE invitations FORCE ROW LEVEL SECURITY',
  `CREATE POLICY invitations_read ON invitations FOR SELECT USING (${OWN})`,
  `CREATE POLICY invitations_insert ON invitations FOR INSERT WITH CHECK (${OWN})`,
  `CREATE POLICY invitations_update ON invitations FOR UPDATE USING (${OWN}) WITH CHECK (${OWN})`,
  `CREATE TABLE reset_asks (
    email_digest text NOT NULL, asked integer NOT NULL, since timestamptz NOT NULL,
    CONSTRAINT reset_asks_pkey PRIMARY KEY (email_digest))`,
]
