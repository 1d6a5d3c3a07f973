import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { SavedQuery } from '../../shared/contract/savedFilter.ts'

/** A filter of the register that an account keeps under a name. */
@Entity({ name: 'saved_filters' })
@Index('saved_filters_account_idx', ['farmId', 'accountId', 'name'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'saved_filters_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'saved_filters_account_fkey' })
export class SavedFilter {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'saved_filters_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'saved_filters_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid' }) accountId!: string
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'jsonb' }) query!: SavedQuery
  /** Digest of the command that made it; tells a repeat from other content under the same id. */
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
