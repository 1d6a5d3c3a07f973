import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** One movement of a lot; written once. */
@Entity({ name: 'lot_entries' })
@Index('lot_entries_lot_idx', ['farmId', 'lotId', 'at'])
@Index('lot_entries_record_idx', ['farmId', 'recordId'])
@ForeignKey('Lot', ['farmId', 'lotId'], ['farmId', 'id'], { name: 'lot_entries_lot_fkey' })
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'lot_entries_record_fkey' })
@ForeignKey('Person', ['farmId', 'personId'], ['farmId', 'id'], { name: 'lot_entries_person_fkey' })
@Check('lot_entries_kind_check', `kind IN ('received', 'drawn', 'counted', 'returned')`)
export class LotEntry {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'lot_entries_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'lot_entries_pkey' }) id!: string
  @Column({ name: 'lot_id', type: 'uuid' }) lotId!: string
  @Column({ type: 'text' }) kind!: 'received' | 'drawn' | 'counted' | 'returned'
  /** Signed, in the unit of the lot. */
  @Column({ type: 'numeric' }) amount!: string
  @Column({ name: 'left_after', type: 'numeric' }) leftAfter!: string
  @Column({ name: 'record_id', type: 'uuid', nullable: true }) recordId!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ name: 'person_id', type: 'uuid' }) personId!: string
  @Column({ type: 'timestamptz' }) at!: Date
}
