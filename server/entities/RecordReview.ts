import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Somebody read one version of a record and says so; changes nothing, written once. */
@Entity({ name: 'record_reviews' })
@Index('record_reviews_record_idx', ['farmId', 'recordId', 'at'])
@ForeignKey('RecordVersion', ['farmId', 'recordId', 'version'], ['farmId', 'recordId', 'version'], { name: 'record_reviews_version_fkey' })
@ForeignKey('Person', ['farmId', 'reviewedById'], ['farmId', 'id'], { name: 'record_reviews_reviewed_by_fkey' })
export class RecordReview {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'record_reviews_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'record_reviews_pkey' }) id!: string
  @Column({ name: 'record_id', type: 'uuid' }) recordId!: string
  @Column({ type: 'integer' }) version!: number
  @Column({ type: 'integer' }) season!: number
  @Column({ name: 'reviewed_by_id', type: 'uuid' }) reviewedById!: string
  @Column({ type: 'timestamptz' }) at!: Date
  @Column({ type: 'text', nullable: true }) note!: string | null
}
