import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

/** A phone of the farm on which people without e-mail sign in by PIN. It holds a secret; here is its digest. */
@Entity({ name: 'shared_phones' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'shared_phones_farm_fkey' })
@ForeignKey('Person', ['farmId', 'enrolledById'], ['farmId', 'id'], { name: 'shared_phones_enrolled_by_fkey' })
export class SharedPhone {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'shared_phones_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'shared_phones_pkey' }) id!: string
  @Column({ type: 'text' }) name!: string
  @Column({ name: 'secret_digest', type: 'text' }) secretDigest!: string
  @Column({ name: 'enrolled_by_id', type: 'uuid' }) enrolledById!: string
  @Column({ name: 'enrolled_at', type: 'timestamptz' }) enrolledAt!: Date
  @Column({ name: 'last_used_at', type: 'timestamptz', nullable: true }) lastUsedAt!: Date | null
  @Column({ name: 'revoked_at', type: 'timestamptz', nullable: true }) revokedAt!: Date | null
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
