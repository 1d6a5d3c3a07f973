import { Column, Entity, PrimaryColumn } from 'typeorm'

/** How often a new password was asked for under an e-mail, known or not; and from one address of the net; of either its keyed digest alone. */
@Entity({ name: 'reset_asks' })
export class ResetAsk {
  @PrimaryColumn({ name: 'email_digest', type: 'text', primaryKeyConstraintName: 'reset_asks_pkey' }) emailDigest!: string
  @Column({ type: 'integer' }) asked!: number
  @Column({ type: 'timestamptz' }) since!: Date
}
