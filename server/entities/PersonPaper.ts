import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** Training or a licence of a person, with the days it holds. */
@Entity({ name: 'person_papers' })
@Index('person_papers_person_idx', ['farmId', 'personId', 'id'])
@ForeignKey('Person', ['farmId', 'personId'], ['farmId', 'id'], { name: 'person_papers_person_fkey' })
@Check('person_papers_kind_check', `kind IN ('training', 'licence')`)
@Check('person_papers_days_check', 'expires_on >= issued_on')
export class PersonPaper {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'person_papers_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'person_papers_pkey' }) id!: string
  @Column({ name: 'person_id', type: 'uuid' }) personId!: string
  @Column({ type: 'text' }) kind!: 'training' | 'licence'
  @Column({ type: 'text' }) title!: string
  @Column({ type: 'text', nullable: true }) number!: string | null
  @Column({ name: 'issued_on', type: 'date', nullable: true }) issuedOn!: string | null
  /** Last day it holds; null where it does not run out. */
  @Column({ name: 'expires_on', type: 'date', nullable: true }) expiresOn!: string | null
  /** When it was taken out of the list; what stood in it stays. */
  @Column({ name: 'ended_at', type: 'timestamptz', nullable: true }) endedAt!: Date | null
  @Column({ type: 'integer', default: 1 }) revision!: number
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
  @Column({ name: 'created_at', type: 'timestamptz' }) createdAt!: Date
}
