import { Check, Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'
import type { Acknowledged } from '../../shared/contract/common.ts'

/** What a person decided about one job; jobs themselves are worked out, not stored. */
@Entity({ name: 'plan_jobs' })
@ForeignKey('PlanStep', ['farmId', 'stepId'], ['farmId', 'id'], { name: 'plan_jobs_step_fkey' })
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'plan_jobs_block_fkey' })
@ForeignKey('Person', ['farmId', 'skippedById'], ['farmId', 'id'], { name: 'plan_jobs_skipped_by_fkey' })
@Check('plan_jobs_number_check', `number > 0`)
@Check('plan_jobs_skip_check', `(skipped_at IS NULL) = (skipped_by_id IS NULL) AND (skipped_at IS NULL) = (skip_reason IS NULL)`)
export class PlanJob {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'plan_jobs_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'step_id', type: 'uuid', primaryKeyConstraintName: 'plan_jobs_pkey' }) stepId!: string
  @PrimaryColumn({ name: 'block_id', type: 'uuid', primaryKeyConstraintName: 'plan_jobs_pkey' }) blockId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'plan_jobs_pkey' }) number!: number
  /** The day it was moved to; null where it stands at its target. */
  @Column({ name: 'planned_on', type: 'date', nullable: true }) plannedOn!: string | null
  /** What was unlikely about that day, and why it is right. */
  @Column({ type: 'jsonb', default: [] }) acknowledged!: Acknowledged
  @Column({ name: 'skipped_at', type: 'timestamptz', nullable: true }) skippedAt!: Date | null
  @Column({ name: 'skipped_by_id', type: 'uuid', nullable: true }) skippedById!: string | null
  @Column({ name: 'skip_reason', type: 'text', nullable: true }) skipReason!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer' }) revision!: number
}
