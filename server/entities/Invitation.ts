import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Somebody asked onto a farm by letter; the person of the farm is made when they take it. */
@Entity({ name: 'invitations' })
@Index('invitations_open_key', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'invitations_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'invitations_account_fkey' })
@ForeignKey('Person', ['farmId', 'invitedById'], ['farmId', 'id'], { name: 'invitations_invited_by_fkey' })
@Check('invitations_role_check', `role IN ('owner', 'manager', 'applicator')`)
@Check('invitations_language_check', `language IN ('en', 'es')`)
export class Invitation {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'invitations_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'invitations_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  @Column({ type: 'text' }) email!: string
  /** As the inviter calls them; they choose their own. */
  @Column({ type: 'text', nullable: true }) name!: string | null
  @Column({ type: 'text' }) role!: 'owner' | 'manager' | 'applicator'
  @Column({ type: 'text' }) language!: 'en' | 'es'
  @Column({ name: 'invited_by_id', type: 'uuid' }) invitedById!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  /** When the last letter was written. */
  @Column({ name: 'sent_at', type: 'timestamptz' }) sentAt!: Date
  @Column({ name: 'expires_at', type: 'timestamptz' }) expiresAt!: Date
  @Column({ name: 'accepted_at', type: 'timestamptz', nullable: true }) acceptedAt!: Date | null
  @Column({ name: 'withdrawn_at', type: 'timestamptz', nullable: true }) withdrawnAt!: Date | null
  /** Optimistic lock; also counts its letters. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
