import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { AmountUnit } from '../../shared/contract/quantity.ts'

/** Projection of a record’s components, rewritten with it. */
@Entity({ name: 'record_components' })
@Index('record_components_lot_idx', ['farmId', 'lotId'])
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'record_components_record_fkey' })
@ForeignKey('Material', ['farmId', 'materialId'], ['farmId', 'id'], { name: 'record_components_material_fkey' })
@ForeignKey('Lot', ['farmId', 'lotId'], ['farmId', 'id'], { name: 'record_components_lot_fkey' })
export class RecordComponent {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'record_components_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'record_components_pkey' }) recordId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'record_components_pkey' }) position!: number
  @Column({ name: 'material_id', type: 'uuid' }) materialId!: string
  @Column({ name: 'lot_id', type: 'uuid', nullable: true }) lotId!: string | null
  @Column({ type: 'numeric', nullable: true }) amount!: string | null
  @Column({ type: 'text', nullable: true }) unit!: AmountUnit | null
  @Column({ type: 'integer', nullable: true }) season!: number | null
}
