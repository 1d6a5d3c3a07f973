import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { SiteKind } from '../../shared/contract/ground.ts'
import type { PlaceGeometry } from '../../shared/geo/geometryTypes.ts'

/** Something a spray is kept away from. */
@Entity({ name: 'sites' })
@Index('sites_name_idx', ['farmId', 'name', 'id'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'sites_farm_fkey' })
@Check('sites_keep_clear_check', `keep_clear_m > 0`)
export class Site {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'sites_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'sites_pkey' }) id!: string
  @Column({ type: 'text' }) kind!: SiteKind
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'jsonb' }) geometry!: PlaceGeometry
  /** Metres; null where no distance is written down. */
  @Column({ name: 'keep_clear_m', type: 'numeric', nullable: true }) keepClearM!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
  /** First civil day on which it is there no more. */
  @Column({ name: 'ended_on', type: 'date', nullable: true }) endedOn!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
