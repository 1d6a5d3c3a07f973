import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Who did what, when, from where; written once. */
@Entity({ name: 'journal' })
@Index('journal_farm_id_at_idx', { synchronize: false })
@Index('journal_subject_idx', ['farmId', 'subjectId'])
@Index('journal_person_idx', { synchronize: false })
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
  /** Where it was done from: the network without its last part; null where no request did it. */
  @Column({ name: 'from_network', type: 'text', nullable: true }) fromNetwork!: string | null
  /** Names of browser and system. */
  @Column({ name: 'from_device', type: 'text', nullable: true }) fromDevice!: string | null
}
