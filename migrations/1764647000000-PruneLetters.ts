import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Whoever carries letters out also takes old ones away; one that waits stays. */
export class PruneLetters1764647000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query("CREATE POLICY letters_delete ON letters FOR DELETE USING (current_setting('app.post', true) = 'on' AND state <> 'waiting')")
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP POLICY letters_delete ON letters')
  }
}
