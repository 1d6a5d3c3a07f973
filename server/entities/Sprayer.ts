import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Fitting } from '../../shared/contract/calibration.ts'

@Entity({ name: 'sprayers' })
@Index('sprayers_farm_id_code_key', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'sprayers_farm_fkey' })
@Check('sprayers_tank_check', `tank_l > 0 AND tank_l < 1e7`)
@Check('sprayers_flow_check', `flow_l_per_min > 0 AND flow_l_per_min < 1e7`)
@Check('sprayers_retired_check', '(retired_on IS NULL) = (retired_reason IS NULL)')
export class Sprayer {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'sprayers_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'sprayers_pkey' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  /** Usable tank volume, litres. */
  @Column({ name: 'tank_l', type: 'numeric' }) tankL!: string
  /** What it puts out while spraying, litres a minute; null where nobody measured. */
  @Column({ name: 'flow_l_per_min', type: 'numeric', nullable: true }) flowLPerMin!: string | null
  /** What is fitted to it and how it is driven; null where nobody has said. */
  @Column({ type: 'jsonb', nullable: true }) fitting!: Fitting | null
  @Column({ name: 'retired_on', type: 'date', nullable: true }) retiredOn!: string | null
  @Column({ name: 'retired_reason', type: 'text', nullable: true }) retiredReason!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
