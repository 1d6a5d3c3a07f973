import { Check, Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** An organic certificate of the farm, as it was printed; which of them is in force on a day is read off their days. */
@Entity({ name: 'certificates' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'certificates_farm_fkey' })
@Check('certificates_days_check', 'valid_until >= valid_from')
@Check('certificates_withdrawn_check', '(withdrawn_at IS NULL) = (withdrawn_reason IS NULL)')
export class Certificate {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'certificates_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'certificates_pkey' }) id!: string
  @Column({ type: 'text' }) number!: string
  /** Who certifies. */
  @Column({ type: 'text' }) body!: string
  @Column({ type: 'text', nullable: true }) scope!: string | null
  /** Null only of those written down before it was asked. */
  @Column({ name: 'valid_from', type: 'date', nullable: true }) validFrom!: string | null
  /** Null where no end is printed. */
  @Column({ name: 'valid_until', type: 'date', nullable: true }) validUntil!: string | null
  @Column({ name: 'withdrawn_at', type: 'timestamptz', nullable: true }) withdrawnAt!: Date | null
  @Column({ name: 'withdrawn_reason', type: 'text', nullable: true }) withdrawnReason!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
