import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Boundary } from '../../shared/contract/block.ts'
import type { Harvest, SoilContact } from '../../shared/contract/planting.ts'

/** What grows on a block or a part of it, from one day to another. */
@Entity({ name: 'plantings' })
@Index('plantings_block_idx', ['farmId', 'blockId', 'id'])
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'plantings_block_fkey' })
@Check('plantings_span_check', `removed_on >= planted_on`)
@Check('plantings_plants_check', `plants > 0`)
export class Planting {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'plantings_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'plantings_pkey' }) id!: string
  @Column({ name: 'block_id', type: 'uuid' }) blockId!: string
  /** Null for the whole block. */
  @Column({ type: 'jsonb', nullable: true }) part!: Boundary | null
  @Column({ type: 'text' }) crop!: string
  @Column({ type: 'text', nullable: true }) eppo!: string | null
  @Column({ type: 'text', nullable: true }) variety!: string | null
  @Column({ name: 'planted_on', type: 'date', nullable: true }) plantedOn!: string | null
  /** Null while it stands. */
  @Column({ name: 'removed_on', type: 'date', nullable: true }) removedOn!: string | null
  @Column({ name: 'edible_part', type: 'text', nullable: true }) ediblePart!: string | null
  @Column({ name: 'soil_contact', type: 'text', nullable: true }) soilContact!: SoilContact | null
  @Column({ type: 'jsonb' }) harvests!: Harvest[]
  /** How many plants or trees; null where nobody counted. */
  @Column({ type: 'integer', nullable: true }) plants!: number | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
