import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** That a farm's people were told of a day's jobs, so that nobody is told twice. */
@Entity({ name: 'job_digests' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'job_digests_farm_fkey' })
export class JobDigest {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'job_digests_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'on_day', type: 'date', primaryKeyConstraintName: 'job_digests_pkey' }) onDay!: string
  @Column({ type: 'timestamptz' }) at!: Date
  @Column({ type: 'integer' }) letters!: number
}
