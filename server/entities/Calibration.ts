import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Fitting, Measured } from '../../shared/contract/calibration.ts'

/** What was measured on a sprayer; written once, taken back with a reason. Its rate is worked out from `measured` wherever it is read. */
@Entity({ name: 'calibrations' })
@Index('calibrations_sprayer_idx', ['farmId', 'sprayerId', 'onDay', 'id'])
@ForeignKey('Sprayer', ['farmId', 'sprayerId'], ['farmId', 'id'], { name: 'calibrations_sprayer_fkey' })
@ForeignKey('Person', ['farmId', 'byId'], ['farmId', 'id'], { name: 'calibrations_by_fkey' })
@ForeignKey('Person', ['farmId', 'withdrawnById'], ['farmId', 'id'], { name: 'calibrations_withdrawn_by_fkey' })
@Check('calibrations_withdrawn_check', '(withdrawn_at IS NULL) = (withdrawn_by_id IS NULL) AND (withdrawn_at IS NULL) = (withdrawn_reason IS NULL)')
export class Calibration {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'calibrations_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'calibrations_pkey' }) id!: string
  @Column({ name: 'sprayer_id', type: 'uuid' }) sprayerId!: string
  /** Civil day of the farm. */
  @Column({ name: 'on_day', type: 'date' }) onDay!: string
  @Column({ name: 'due_on', type: 'date' }) dueOn!: string
  /** Who measured, in words. */
  @Column({ name: 'done_by', type: 'text' }) doneBy!: string
  @Column({ type: 'jsonb' }) measured!: Measured
  /** What was fitted then. */
  @Column({ type: 'jsonb' }) fitting!: Fitting
  @Column({ type: 'text', nullable: true }) note!: string | null
  /** Who wrote it down. */
  @Column({ name: 'by_id', type: 'uuid' }) byId!: string
  @Column({ type: 'timestamptz' }) at!: Date
  @Column({ name: 'withdrawn_at', type: 'timestamptz', nullable: true }) withdrawnAt!: Date | null
  @Column({ name: 'withdrawn_by_id', type: 'uuid', nullable: true }) withdrawnById!: string | null
  @Column({ name: 'withdrawn_reason', type: 'text', nullable: true }) withdrawnReason!: string | null
  /** Digest of the command that made it. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
