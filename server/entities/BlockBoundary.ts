import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'
import type { Boundary } from '../../shared/contract/block.ts'
import type { Acknowledged } from '../../shared/contract/common.ts'

/** One version of a block's outline; written once. */
@Entity({ name: 'block_boundaries' })
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'block_boundaries_block_fkey' })
@ForeignKey('Person', ['farmId', 'byId'], ['farmId', 'id'], { name: 'block_boundaries_by_fkey' })
export class BlockBoundary {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'block_boundaries_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'block_id', type: 'uuid', primaryKeyConstraintName: 'block_boundaries_pkey' }) blockId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'block_boundaries_pkey' }) version!: number
  @Column({ type: 'jsonb' }) geometry!: Boundary
  /** On the WGS84 ellipsoid, square metres. */
  @Column({ name: 'area_m2', type: 'numeric' }) areaM2!: string
  /** All rings, metres. */
  @Column({ name: 'perimeter_m', type: 'numeric' }) perimeterM!: string
  /** The day it was drawn or walked, as whoever drew it says. */
  @Column({ name: 'drawn_on', type: 'date' }) drawnOn!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'jsonb', default: [] }) acknowledged!: Acknowledged
  /** Null where an older schema did not say. */
  @Column({ name: 'by_id', type: 'uuid', nullable: true }) byId!: string | null
  @Column({ type: 'timestamptz' }) at!: Date
}
