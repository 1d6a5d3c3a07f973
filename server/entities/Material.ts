import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { LabelLimits, MaterialKind, OrganicStatus } from '../../shared/contract/input.ts'

@Entity({ name: 'materials' })
@Index('materials_farm_id_name_key', { synchronize: false })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'materials_farm_fkey' })
@Check('materials_measured_in_check', `measured_in IN ('volume', 'mass')`)
export class Material {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'materials_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'materials_pkey' }) id!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'text' }) kind!: MaterialKind
  @Column({ name: 'measured_in', type: 'text' }) measuredIn!: 'volume' | 'mass'
  @Column({ name: 'organic_status', type: 'text' }) organicStatus!: OrganicStatus
  @Column({ name: 'status_basis', type: 'text', nullable: true }) statusBasis!: string | null
  @Column({ type: 'jsonb', nullable: true }) label!: LabelLimits | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
