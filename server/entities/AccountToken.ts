import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** A one-time link; only its digest is kept. */
@Entity({ name: 'account_tokens' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'account_tokens_account_fkey' })
export class AccountToken {
  @PrimaryColumn({ name: 'token_hash', type: 'text', primaryKeyConstraintName: 'account_tokens_pkey' }) tokenHash!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  @Column({ type: 'text' }) kind!: 'welcome' | 'invitation' | 'reset'
  /** What the link is about beside the account: farm and invitation. */
  @Column({ type: 'jsonb', default: {} }) detail!: object
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  @Column({ name: 'expires_at', type: 'timestamptz' }) expiresAt!: Date
  @Column({ name: 'used_at', type: 'timestamptz', nullable: true }) usedAt!: Date | null
}
