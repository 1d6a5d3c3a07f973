import { Check, Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** What a farm means to do in a season: steps that make rounds. */
@Entity({ name: 'season_plans' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'season_plans_farm_fkey' })
@Check('season_plans_ended_check', `(ended_at IS NULL) = (ended_reason IS NULL)`)
export class SeasonPlan {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'season_plans_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'season_plans_pkey' }) id!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
  /** Null while it runs. */
  @Column({ name: 'ended_at', type: 'timestamptz', nullable: true }) endedAt!: Date | null
  @Column({ name: 'ended_reason', type: 'text', nullable: true }) endedReason!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
