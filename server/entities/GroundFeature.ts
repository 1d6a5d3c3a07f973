import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { GroundKind } from '../../shared/contract/ground.ts'
import type { PlaceGeometry } from '../../shared/geo/geometryTypes.ts'

/** A piece of the farm's own ground plan. */
@Entity({ name: 'ground_features' })
@Index('ground_features_name_idx', ['farmId', 'name', 'id'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'ground_features_farm_fkey' })
@Check('ground_features_width_check', `width_m > 0`)
export class GroundFeature {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'ground_features_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'ground_features_pkey' }) id!: string
  @Column({ type: 'text' }) kind!: GroundKind
  /** Empty for what has none, so that lists have an order. */
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'jsonb' }) geometry!: PlaceGeometry
  /** How wide a line is, metres. */
  @Column({ name: 'width_m', type: 'numeric', nullable: true }) widthM!: string | null
  /** First civil day on which it is there no more. */
  @Column({ name: 'ended_on', type: 'date', nullable: true }) endedOn!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
