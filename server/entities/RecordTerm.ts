import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

/** Projection of what a record is found by, rewritten with it; `recordTerms` says which terms there are. */
@Entity({ name: 'record_terms' })
@Index('record_terms_find_idx', { synchronize: false })
export class RecordTerm {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'record_terms_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'record_terms_pkey' }) recordId!: string
  /** Compared byte by byte, so that a beginning is a range. */
  @PrimaryColumn({ type: 'text', collation: 'C', primaryKeyConstraintName: 'record_terms_pkey' }) term!: string
  @Column({ type: 'integer', nullable: true }) season!: number | null
  @Column({ name: 'work_season', type: 'integer' }) workSeason!: number
  @Column({ name: 'sort_at', type: 'timestamptz' }) sortAt!: Date
}
