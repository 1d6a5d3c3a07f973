import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { RecordState } from '../../shared/contract/record.ts'
import type { Method } from '../../shared/contract/recordContent.ts'

/** Projection of a record that the register is sorted and added up by, rewritten with it. */
@Entity({ name: 'register_entries' })
@Index('register_entries_season_idx', { synchronize: false })
@Index('register_entries_number_idx', { synchronize: false })
@Index('register_entries_area_idx', { synchronize: false })
@ForeignKey('ApplicationRecord', ['farmId', 'recordId'], ['farmId', 'id'], { name: 'register_entries_record_fkey' })
export class RegisterEntry {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'register_entries_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'record_id', type: 'uuid', primaryKeyConstraintName: 'register_entries_pkey' }) recordId!: string
  @Column({ type: 'text' }) state!: RecordState
  @Column({ type: 'text' }) method!: Method
  /** Null until it is signed: a certifier sees no unsigned record. */
  @Column({ type: 'integer', nullable: true }) season!: number | null
  /** The season the work lies in, signed or not. */
  @Column({ name: 'work_season', type: 'integer' }) workSeason!: number
  @Column({ name: 'sort_at', type: 'timestamptz' }) sortAt!: Date
  /** Season and number in one; what has no number yet comes after all that have. */
  @Column({ name: 'number_sort', type: 'bigint' }) numberSort!: string
  /** The area again, as a kind that an index may compare before the policies have looked. */
  @Column({ name: 'area_sort', type: 'double precision' }) areaSort!: number
  @Column({ name: 'area_ha', type: 'numeric' }) areaHa!: string
  @Column({ name: 'total_l', type: 'numeric', nullable: true }) totalL!: string | null
  /** Kilograms of all components by mass; 0 where there are none. */
  @Column({ name: 'total_kg', type: 'numeric' }) totalKg!: string
  @Column({ type: 'boolean' }) late!: boolean
}
