import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Who did what, when; written once. */
@Entity({ name: 'journal' })
@Index('journal_farm_id_at_idx', { synchronize: false })
@Index('journal_subject_idx', ['farmId', 'subjectId'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'journal_farm_fkey' })
export class JournalEntry {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'journal_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'journal_pkey' }) id!: string
  @Column({ type: 'timestamptz' }) at!: Date
  @Column({ name: 'person_id', type: 'uuid', nullable: true }) personId!: string | null
  @Column({ name: 'account_id', type: 'uuid', nullable: true }) accountId!: string | null
  @Column({ type: 'text' }) action!: string
  @Column({ name: 'subject_id', type: 'uuid', nullable: true }) subjectId!: string | null
  @Column({ type: 'jsonb', default: {} }) detail!: object
}
