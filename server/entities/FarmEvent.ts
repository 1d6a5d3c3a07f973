import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { FarmEventKind } from '../../shared/contract/farmEvent.ts'

/** Something done or seen on blocks that is no application; written once, taken back with a reason. */
@Entity({ name: 'farm_events' })
@Index('farm_events_day_idx', ['farmId', 'onDay', 'id'])
@ForeignKey('Person', ['farmId', 'byId'], ['farmId', 'id'], { name: 'farm_events_by_fkey' })
@ForeignKey('Person', ['farmId', 'withdrawnById'], ['farmId', 'id'], { name: 'farm_events_withdrawn_by_fkey' })
@Check('farm_events_kind_check', `kind IN ('mulched', 'planted', 'mown', 'watered', 'first_pick', 'other')`)
@Check('farm_events_withdrawn_check', `(withdrawn_at IS NULL) = (withdrawn_by_id IS NULL) AND (withdrawn_at IS NULL) = (withdrawn_reason IS NULL)`)
export class FarmEvent {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'farm_events_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'farm_events_pkey' }) id!: string
  @Column({ type: 'text' }) kind!: FarmEventKind
  @Column({ name: 'on_day', type: 'date' }) onDay!: string
  /** Season of that day; what a grant opens. */
  @Column({ type: 'integer' }) season!: number
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ name: 'by_id', type: 'uuid' }) byId!: string
  @Column({ type: 'timestamptz' }) at!: Date
  @Column({ name: 'withdrawn_at', type: 'timestamptz', nullable: true }) withdrawnAt!: Date | null
  @Column({ name: 'withdrawn_by_id', type: 'uuid', nullable: true }) withdrawnById!: string | null
  @Column({ name: 'withdrawn_reason', type: 'text', nullable: true }) withdrawnReason!: string | null
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
