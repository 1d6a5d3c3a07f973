import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * What a record took of its lots, and what the journal says of one thing, are found without reading a farm's years. Files stay
 * behind when an unsigned record is discarded: the journal names them.
 */
export class FindBySubject1764604000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query('CREATE INDEX lot_entries_record_idx ON lot_entries (farm_id, record_id)')
    await db.query('CREATE INDEX journal_subject_idx ON journal (farm_id, subject_id)')
    await db.query('ALTER TABLE attachments DROP CONSTRAINT attachments_record_fkey')
  }

  async down(db: QueryRunner): Promise<void> {
    // Files of records that are gone keep this from being taken back whole: new ones are checked, old ones are not.
    await db.query('ALTER TABLE attachments ADD CONSTRAINT attachments_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id) NOT VALID')
    await db.query('DROP INDEX journal_subject_idx')
    await db.query('DROP INDEX lot_entries_record_idx')
  }
}
