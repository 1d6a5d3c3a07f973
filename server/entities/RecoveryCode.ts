import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** A code that stands in once for the second factor; only its digest is kept. */
@Entity({ name: 'recovery_codes' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'recovery_codes_account_fkey' })
export class RecoveryCode {
  @PrimaryColumn({ name: 'account_id', type: 'uuid', primaryKeyConstraintName: 'recovery_codes_pkey' }) accountId!: string
  @PrimaryColumn({ name: 'code_digest', type: 'text', primaryKeyConstraintName: 'recovery_codes_pkey' }) codeDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  /** When it was spent, or replaced by newer codes. */
  @Column({ name: 'used_at', type: 'timestamptz', nullable: true }) usedAt!: Date | null
}
