import { Check, Column, Entity, PrimaryColumn, Unique } from 'typeorm'

/** Who signs in; global. What a person is on a farm stands in people and grants. */
@Entity({ name: 'accounts' })
@Unique('accounts_email_key', ['email'])
@Check('accounts_language_check', `language IN ('en', 'es')`)
export class Account {
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'accounts_pkey' }) id!: string
  /** Lower case; names the account. */
  @Column({ type: 'text' }) email!: string
  @Column({ type: 'text' }) name!: string
  @Column({ name: 'password_hash', type: 'text', nullable: true }) passwordHash!: string | null
  @Column({ type: 'text', default: 'en' }) language!: 'en' | 'es'
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  @Column({ name: 'deactivated_at', type: 'timestamptz', nullable: true }) deactivatedAt!: Date | null
}
