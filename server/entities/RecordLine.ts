import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Projection of a record’s block lines, rewritten with it. */
@Entity({ name: 'record_lines' })
@Index('record_lines_block_idx', { synchronize: false })
@Index('record_lines_held_idx', { synchronize: false })
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'record_lines_record_fkey' })
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'record_lines_block_fkey' })
export class RecordLine {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'record_lines_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'record_lines_pkey' }) recordId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'record_lines_pkey' }) position!: number
  @Column({ name: 'block_id', type: 'uuid' }) blockId!: string
  @Column({ type: 'integer', nullable: true }) season!: number | null
  @Column({ name: 'sort_at', type: 'timestamptz' }) sortAt!: Date
  /** Last civil day on which the line of a signed record keeps people out or picking back; null where no label does. */
  @Column({ name: 'held_to', type: 'date', nullable: true }) heldTo!: string | null
}
