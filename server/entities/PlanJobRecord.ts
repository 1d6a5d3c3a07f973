import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** The job that a record was opened from, or found to do when it was signed; it does it once it is signed. */
@Entity({ name: 'plan_job_records' })
@Index('plan_job_records_step_idx', ['farmId', 'stepId'])
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'plan_job_records_record_fkey' })
@ForeignKey('PlanStep', ['farmId', 'stepId'], ['farmId', 'id'], { name: 'plan_job_records_step_fkey' })
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'plan_job_records_block_fkey' })
@Check('plan_job_records_number_check', `number > 0`)
export class PlanJobRecord {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'plan_job_records_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'plan_job_records_pkey' }) recordId!: string
  @PrimaryColumn({ name: 'step_id', type: 'uuid', primaryKeyConstraintName: 'plan_job_records_pkey' }) stepId!: string
  @PrimaryColumn({ name: 'block_id', type: 'uuid', primaryKeyConstraintName: 'plan_job_records_pkey' }) blockId!: string
  @Column({ type: 'integer' }) number!: number
}
