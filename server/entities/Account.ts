import { Check, Column, Entity, PrimaryColumn, Unique } from 'typeorm'
import type { Preferences } from '../../shared/contract/preferences.ts'

/** Who signs in; global. What a person is on a farm stands in people and grants. */
@Entity({ name: 'accounts' })
@Unique('accounts_email_key', ['email'])
@Check('accounts_language_check', `language IN ('en', 'es')`)
@Check('accounts_kind_check', `kind IN ('email', 'pin') AND (kind = 'pin') = (email IS NULL)`)
export class Account {
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'accounts_pkey' }) id!: string
  /** Lower case; names the account. Null for somebody with a PIN, who signs in on a shared phone of their farm alone. */
  @Column({ type: 'text', nullable: true }) email!: string | null
  @Column({ type: 'text', default: 'email' }) kind!: 'email' | 'pin'
  @Column({ type: 'text' }) name!: string
  /** Of the password, or of the PIN. */
  @Column({ name: 'password_hash', type: 'text', nullable: true }) passwordHash!: string | null
  @Column({ type: 'text', default: 'en' }) language!: 'en' | 'es'
  /** What follows the person from device to device. */
  @Column({ type: 'jsonb', default: {} }) preferences!: Preferences
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Secret of the second factor, sealed; null where there is none. */
  @Column({ name: 'totp_secret', type: 'text', nullable: true }) totpSecret!: string | null
  /** One that is being set up and is not confirmed yet, sealed. */
  @Column({ name: 'totp_pending', type: 'text', nullable: true }) totpPending!: string | null
  /** Time step of the code that was used last; it and those before are spent. */
  @Column({ name: 'totp_step', type: 'integer', nullable: true }) totpStep!: number | null
  @Column({ name: 'totp_since', type: 'timestamptz', nullable: true }) totpSince!: Date | null
  /** The farm it tries things on; never counted among its farms. */
  @Column({ name: 'practice_farm_id', type: 'uuid', nullable: true }) practiceFarmId!: string | null
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  @Column({ name: 'deactivated_at', type: 'timestamptz', nullable: true }) deactivatedAt!: Date | null
}
