import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { LotOrigin } from '../../shared/contract/input.ts'
import type { AmountUnit } from '../../shared/contract/quantity.ts'

@Entity({ name: 'lots' })
@Index('lots_farm_id_code_key', { synchronize: false })
@Index('lots_farm_id_material_id_idx', ['farmId', 'materialId'])
@ForeignKey('Material', ['farmId', 'materialId'], ['farmId', 'id'], { name: 'lots_material_fkey' })
@Check('lots_quantity_check', `quantity > 0 AND quantity < 1e9`)
@Check('lots_left_check', `left_quantity >= 0 AND left_quantity < 1e9`)
export class Lot {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'lots_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'lots_pkey' }) id!: string
  @Column({ name: 'material_id', type: 'uuid' }) materialId!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) origin!: LotOrigin
  @Column({ type: 'text', nullable: true }) source!: string | null
  @Column({ name: 'received_on', type: 'date' }) receivedOn!: string
  @Column({ type: 'numeric' }) quantity!: string
  @Column({ type: 'text' }) unit!: AmountUnit
  /** In the unit received; never below zero, the database sees to it. */
  @Column({ name: 'left_quantity', type: 'numeric' }) leftQuantity!: string
  @Column({ name: 'expires_on', type: 'date', nullable: true }) expiresOn!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
