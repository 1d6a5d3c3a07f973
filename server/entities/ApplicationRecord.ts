import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm'
import type { Acknowledged } from '../../shared/contract/common.ts'
import type { Check as RecordCheck, Computed, RegisterRow } from '../../shared/contract/record.ts'
import type { RecordContent } from '../../shared/contract/recordContent.ts'

/** An application record as it stands now; what was signed stands in record_versions. */
@Entity({ name: 'application_records' })
@Unique('application_records_farm_id_season_number_key', ['farmId', 'season', 'number'])
@Index('application_records_register_idx', { synchronize: false })
@Index('application_records_unsigned_idx', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'application_records_farm_fkey' })
@ForeignKey('Person', ['farmId', 'doneById'], ['farmId', 'id'], { name: 'application_records_done_by_fkey' })
@ForeignKey('Person', ['farmId', 'enteredById'], ['farmId', 'id'], { name: 'application_records_entered_by_fkey' })
@ForeignKey('Person', ['farmId', 'signedById'], ['farmId', 'id'], { name: 'application_records_signed_by_fkey' })
@Check('application_records_state_check', `state IN ('draft', 'started', 'signed', 'withdrawn')`)
@Check('application_records_signed_check', `(state IN ('signed', 'withdrawn')) = (season IS NOT NULL AND number IS NOT NULL AND seq IS NOT NULL AND digest IS NOT NULL AND signed_by_id IS NOT NULL AND signed_at IS NOT NULL)`)
export class ApplicationRecord {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'application_records_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'application_records_pkey' }) id!: string
  @Column({ type: 'text' }) state!: 'draft' | 'started' | 'signed' | 'withdrawn'
  /** What a person wrote, whole; the columns beside it are for finding and guarding. */
  @Column({ type: 'jsonb' }) content!: RecordContent
  @Column({ type: 'jsonb' }) computed!: Computed
  @Column({ type: 'jsonb' }) checks!: RecordCheck[]
  @Column({ type: 'jsonb', default: [] }) acknowledged!: Acknowledged
  @Column({ name: 'register_row', type: 'jsonb' }) registerRow!: Omit<RegisterRow, 'id' | 'state'>
  @Column({ type: 'integer', nullable: true }) season!: number | null
  @Column({ type: 'integer', nullable: true }) number!: number | null
  @Column({ type: 'integer', nullable: true }) seq!: number | null
  @Column({ type: 'text', nullable: true }) digest!: string | null
  /** Counts signed versions. */
  @Column({ type: 'integer', default: 0 }) version!: number
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** First start, or receipt where there is none: the order of the register. */
  @Column({ name: 'sort_at', type: 'timestamptz' }) sortAt!: Date
  @Column({ name: 'done_by_id', type: 'uuid' }) doneById!: string
  @Column({ name: 'entered_by_id', type: 'uuid' }) enteredById!: string
  @Column({ name: 'signed_by_id', type: 'uuid', nullable: true }) signedById!: string | null
  @Column({ name: 'device_at', type: 'timestamptz', nullable: true }) deviceAt!: Date | null
  @Column({ name: 'received_at', type: 'timestamptz' }) receivedAt!: Date
  @Column({ name: 'signed_at', type: 'timestamptz', nullable: true }) signedAt!: Date | null
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
