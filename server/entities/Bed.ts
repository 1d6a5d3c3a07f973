import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { BedKind } from '../../shared/contract/bed.ts'

/** Beds or rows of a block that are alike. */
@Entity({ name: 'beds' })
@Index('beds_block_idx', ['farmId', 'blockId', 'id'])
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'beds_block_fkey' })
@Check('beds_kind_check', `kind IN ('bed', 'row')`)
@Check('beds_count_check', `count > 0 AND plants > 0 AND length_m > 0 AND width_m > 0`)
@Check('beds_numbers_check', `(from_number IS NULL) = (to_number IS NULL) AND from_number <= to_number`)
export class Bed {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'beds_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'beds_pkey' }) id!: string
  @Column({ name: 'block_id', type: 'uuid' }) blockId!: string
  @Column({ type: 'text' }) kind!: BedKind
  @Column({ type: 'text', nullable: true }) name!: string | null
  @Column({ name: 'from_number', type: 'integer', nullable: true }) fromNumber!: number | null
  @Column({ name: 'to_number', type: 'integer', nullable: true }) toNumber!: number | null
  @Column({ type: 'integer' }) count!: number
  /** Of each, metres. */
  @Column({ name: 'length_m', type: 'numeric', nullable: true }) lengthM!: string | null
  /** Of each, metres. */
  @Column({ name: 'width_m', type: 'numeric', nullable: true }) widthM!: string | null
  /** In all of them together; null where nobody counted. */
  @Column({ type: 'integer', nullable: true }) plants!: number | null
  @Column({ name: 'ended_on', type: 'date', nullable: true }) endedOn!: string | null
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
