import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Farm × seasons × certifier, with an end. */
@Entity({ name: 'grants' })
@Index('grants_account_id_idx', ['accountId'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'grants_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'grants_account_fkey' })
export class Grant {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'grants_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'grants_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  @Column({ type: 'integer', array: true }) seasons!: number[]
  /** Last civil day, in the farm’s zone, on which it opens the farm. */
  @Column({ name: 'ends_on', type: 'date' }) endsOn!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
