import { Check, Column, Entity, PrimaryColumn } from 'typeorm'
import type { Contact, RuleSet } from '../../shared/contract/farmProfile.ts'
import type { StartStep } from '../../shared/contract/start.ts'

@Entity({ name: 'farms' })
@Check('farms_units_check', `units IN ('metric', 'us')`)
@Check('farms_calibration_check', 'calibration_days BETWEEN 1 AND 1830')
export class Farm {
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'farms_pkey' }) id!: string
  @Column({ type: 'text' }) name!: string
  /** IANA time zone of the land. */
  @Column({ type: 'text' }) zone!: string
  /** MM-DD. */
  @Column({ name: 'season_start', type: 'text' }) seasonStart!: string
  /** Whether owner, manager and certifier need a second factor to open it. */
  @Column({ name: 'asks_second_factor', type: 'boolean', default: false }) asksSecondFactor!: boolean
  /** Which figures are read first. */
  @Column({ type: 'text', default: 'metric' }) units!: 'metric' | 'us'
  @Column({ type: 'jsonb', nullable: true }) contact!: Contact | null
  /** Public law that the farm says it works under. */
  @Column({ name: 'rule_sets', type: 'jsonb', default: [] }) ruleSets!: RuleSet[]
  /** Days from one calibration of a sprayer to the next. */
  @Column({ name: 'calibration_days', type: 'integer', default: 365 }) calibrationDays!: number
  /** Where the map opens while no block is drawn, [lon, lat]. */
  @Column({ type: 'jsonb', nullable: true }) home!: [number, number] | null
  /** Made to try things on. */
  @Column({ type: 'boolean', default: false }) practice!: boolean
  /** Steps of the first hour that were passed over. */
  @Column({ name: 'start_skipped', type: 'jsonb', default: [] }) startSkipped!: StartStep[]
  /** The first hour is not offered any more. */
  @Column({ name: 'start_away', type: 'boolean', default: false }) startAway!: boolean
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
