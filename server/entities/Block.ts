import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { BlockEnd, Boundary } from '../../shared/contract/block.ts'
import type { Acknowledged } from '../../shared/contract/common.ts'
import type { Land } from '../../shared/contract/land.ts'

@Entity({ name: 'blocks' })
@Index('blocks_farm_id_code_key', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'blocks_farm_fkey' })
@Check('blocks_area_check', `area_m2 > 0 AND area_m2 < 1e12`)
@Check('blocks_ended_check', `(ended_on IS NULL) = (ended_by IS NULL) AND ended_by IN ('split', 'merge', 'undone')`)
export class Block {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'blocks_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'blocks_pkey' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text', nullable: true }) crop!: string | null
  @Column({ type: 'jsonb' }) geometry!: Boundary
  /** Plan area on the WGS84 ellipsoid, square metres; always computed from the boundary. */
  @Column({ name: 'area_m2', type: 'numeric' }) areaM2!: string
  /** All rings, metres. */
  @Column({ name: 'perimeter_m', type: 'numeric' }) perimeterM!: string
  /** Counts boundary versions. */
  @Column({ type: 'integer', default: 1 }) version!: number
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  @Column({ type: 'jsonb', default: [] }) acknowledged!: Acknowledged
  /** The farm's day on which it ceased to be a block of its own; null while it is one. */
  @Column({ name: 'ended_on', type: 'date', nullable: true }) endedOn!: string | null
  @Column({ name: 'ended_by', type: 'text', nullable: true }) endedBy!: BlockEnd | null
  /** Blocks it was cut from or put together from. */
  @Column({ name: 'from_ids', type: 'uuid', array: true }) fromIds!: string[]
  /** Blocks that came of it when it ended. */
  @Column({ name: 'into_ids', type: 'uuid', array: true }) intoIds!: string[]
  /** Null where nobody has said anything about its status. */
  @Column({ type: 'jsonb', nullable: true }) land!: Land | null
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
