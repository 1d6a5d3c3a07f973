import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Up to which entry of a season's log somebody took a report, and the code of all entries up to it; written once. */
@Entity({ name: 'season_heads' })
@Index('season_heads_account_idx', { synchronize: false })
@Index('season_heads_code_idx', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'season_heads_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'season_heads_account_fkey' })
export class SeasonHead {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'season_heads_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'season_heads_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  @Column({ type: 'integer' }) season!: number
  /** The last entry of the farm's log that belongs to the season. */
  @Column({ type: 'integer' }) seq!: number
  @Column({ type: 'text' }) digest!: string
  @Column({ name: 'taken_at', type: 'timestamptz' }) takenAt!: Date
}
