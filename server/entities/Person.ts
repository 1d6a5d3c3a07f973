import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm'
import type { Role } from '../../shared/contract/session.ts'

/** A person of one farm, with or without an account. */
@Entity({ name: 'people' })
@Unique('people_farm_id_account_id_key', ['farmId', 'accountId'])
@Index('people_account_id_idx', ['accountId'])
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'people_farm_fkey' })
@ForeignKey('Account', ['accountId'], ['id'], { name: 'people_account_fkey' })
@Check('people_role_check', `role IN ('owner', 'manager', 'applicator')`)
export class Person {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'people_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'people_pkey' }) id!: string
  @Column({ name: 'account_id', type: 'uuid', nullable: true }) accountId!: string | null
  /** Can be blanked; signed text holds a salted digest of it. */
  @Column({ type: 'text' }) name!: string
  @Column({ name: 'name_salt', type: 'text' }) nameSalt!: string
  @Column({ type: 'text' }) role!: Exclude<Role, 'certifier'>
  @Column({ type: 'boolean', default: true }) active!: boolean
  /** Optimistic lock: counts writes. */
  @Column({ type: 'integer', default: 1 }) revision!: number
  /** Digest of the command that made the person; empty where none did: a farm's first owner, an invitation taken up. */
  @Column({ name: 'creation_digest', type: 'text', default: '' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
