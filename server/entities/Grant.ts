import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Farm × seasons × certifier, with an end. */
@Entity({ name: 'grants' })
@Index('grants_account_id_idx', ['accountId'])
@Check('grants_seasons_check', 'cardinality(seasons) >= 1')
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'grants_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'grants_account_fkey' })
@ForeignKey('Person', ['farmId', 'givenById'], ['farmId', 'id'], { name: 'grants_given_by_fkey' })
export class Grant {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'grants_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'grants_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  /** Who reviews, as the owner wrote it: the certifying body, the public office. */
  @Column({ type: 'text', default: '' }) organisation!: string
  @Column({ type: 'integer', array: true }) seasons!: number[]
  /** Last civil day, in the farm’s zone, on which it opens the farm. */
  @Column({ name: 'ends_on', type: 'date' }) endsOn!: string
  /** Ended before its last day. */
  @Column({ name: 'ended_at', type: 'timestamptz', nullable: true }) endedAt!: Date | null
  @Column({ name: 'given_by_id', type: 'uuid', nullable: true }) givenById!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text', default: '' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
