import { Column, Entity, PrimaryColumn } from 'typeorm'

@Entity({ name: 'farms' })
export class Farm {
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'farms_pkey' }) id!: string
  @Column({ type: 'text' }) name!: string
  /** IANA time zone of the land. */
  @Column({ type: 'text' }) zone!: string
  /** MM-DD. */
  @Column({ name: 'season_start', type: 'text' }) seasonStart!: string
  /** Whether owner, manager and certifier need a second factor to open it. */
  @Column({ name: 'asks_second_factor', type: 'boolean', default: false }) asksSecondFactor!: boolean
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
