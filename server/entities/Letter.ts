import { Check, Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm'

/** What kept a letter from going: one of few reasons, and the number that the other server answered with. */
export interface LetterFault {
  reason: 'unreachable' | 'refused' | 'login' | 'unreadable' | 'other'
  answer: number | null
}

/** A letter of a farm or of the house, written with what it tells of and sent afterwards. A key takes no null: the house's own stand under the nil id. */
@Entity({ name: 'letters' })
@Unique('letters_farm_id_once_key', ['farmId', 'once'])
@Index('letters_due_idx', { synchronize: false })
@Index('letters_farm_id_created_at_idx', { synchronize: false })
@Check('letters_language_check', `language IN ('en', 'es')`)
@Check('letters_state_check', `state IN ('waiting', 'sent', 'dead')`)
export class Letter {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'letters_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'letters_pkey' }) id!: string
  @Column({ type: 'text' }) kind!: string
  /** What the words are filled with; secrets in it are blanked once the letter is out. */
  @Column({ type: 'jsonb' }) params!: object
  @Column({ type: 'text' }) language!: 'en' | 'es'
  @Column({ name: 'to_email', type: 'text' }) toEmail!: string
  @Column({ name: 'to_name', type: 'text', nullable: true }) toName!: string | null
  @Column({ name: 'reply_email', type: 'text', nullable: true }) replyEmail!: string | null
  @Column({ name: 'reply_name', type: 'text', nullable: true }) replyName!: string | null
  /** One for all tries, so that a repeat is known. */
  @Column({ name: 'message_id', type: 'text' }) messageId!: string
  @Column({ type: 'text', default: 'waiting' }) state!: 'waiting' | 'sent' | 'dead'
  @Column({ type: 'integer', default: 0 }) tries!: number
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
  @Column({ name: 'next_try_at', type: 'timestamptz' }) nextTryAt!: Date
  /** Until when one process has it in hand; later anybody may try. */
  @Column({ name: 'claimed_until', type: 'timestamptz', nullable: true }) claimedUntil!: Date | null
  @Column({ name: 'sent_at', type: 'timestamptz', nullable: true }) sentAt!: Date | null
  @Column({ name: 'last_fault', type: 'jsonb', nullable: true }) lastFault!: LetterFault | null
  /** What it tells of, where that may be told only once. */
  @Column({ type: 'text', nullable: true }) once!: string | null
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
