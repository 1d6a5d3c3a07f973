import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm'

/** One signed version; written once. */
@Entity({ name: 'record_versions' })
@Unique('record_versions_farm_id_seq_key', ['farmId', 'seq'])
@Check('record_versions_entry_check', `entry IN ('signed', 'amended', 'withdrawn')`)
@Check('record_versions_signed_with_check', `signed_with IN ('password', 'pin')`)
@Index('record_versions_check_code_idx', ['checkCode'])
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'record_versions_record_fkey' })
@ForeignKey('Person', ['farmId', 'signedById'], ['farmId', 'id'], { name: 'record_versions_signed_by_fkey' })
export class RecordVersion {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'record_versions_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'record_versions_pkey' }) recordId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'record_versions_pkey' }) version!: number
  /** Entry of the farm’s log; gapless. */
  @Column({ type: 'integer' }) seq!: number
  @Column({ type: 'integer' }) season!: number
  @Column({ type: 'text' }) number!: string
  /** What this version did. */
  @Column({ type: 'text', default: 'signed' }) entry!: 'signed' | 'amended' | 'withdrawn'
  /** RFC 8785 text of the SignedRecord; what the digest is over. */
  @Column({ name: 'canonical_text', type: 'text' }) canonicalText!: string
  @Column({ type: 'text' }) digest!: string
  @Column({ name: 'check_code', type: 'text' }) checkCode!: string
  @Column({ name: 'signed_by_id', type: 'uuid' }) signedById!: string
  @Column({ name: 'signed_at', type: 'timestamptz' }) signedAt!: Date
  /** What was asked of the signer: a password, or the PIN on a shared phone. */
  @Column({ name: 'signed_with', type: 'text', default: 'password' }) signedWith!: 'password' | 'pin'
  @Column({ type: 'text', nullable: true }) reason!: string | null
}
