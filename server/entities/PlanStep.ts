import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Basis, Method, Water } from '../../shared/contract/recordContent.ts'
import type { STEP_KINDS } from '../../shared/contract/seasonPlan.ts'

/** One preparation put on a set of blocks in a rhythm. A step that was taken out of its plan stays: records may have been opened from its jobs. */
@Entity({ name: 'plan_steps' })
@Index('plan_steps_plan_idx', ['farmId', 'planId', 'position'])
@ForeignKey('SeasonPlan', ['farmId', 'planId'], ['farmId', 'id'], { name: 'plan_steps_plan_fkey' })
@ForeignKey('Material', ['farmId', 'materialId'], ['farmId', 'id'], { name: 'plan_steps_material_fkey' })
@Check('plan_steps_rhythm_check', `every_days > 0 AND early_days >= 0 AND early_days < every_days AND late_days >= 0 AND first_on <= last_on`)
export class PlanStep {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'plan_steps_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'plan_steps_pkey' }) id!: string
  @Column({ name: 'plan_id', type: 'uuid' }) planId!: string
  @Column({ type: 'integer' }) position!: number
  @Column({ type: 'text' }) kind!: (typeof STEP_KINDS)[number]
  @Column({ type: 'text' }) method!: Method
  @Column({ name: 'material_id', type: 'uuid' }) materialId!: string
  @Column({ type: 'jsonb' }) basis!: Basis
  @Column({ type: 'jsonb', nullable: true }) water!: Water | null
  @Column({ name: 'block_ids', type: 'uuid', array: true }) blockIds!: string[]
  /** Days from the day done to the next target. */
  @Column({ name: 'every_days', type: 'integer' }) everyDays!: number
  @Column({ name: 'first_on', type: 'date' }) firstOn!: string
  @Column({ name: 'last_on', type: 'date' }) lastOn!: string
  @Column({ name: 'early_days', type: 'integer' }) earlyDays!: number
  @Column({ name: 'late_days', type: 'integer' }) lateDays!: number
  @Column({ name: 'removed_at', type: 'timestamptz', nullable: true }) removedAt!: Date | null
}
