import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** A photo or paper of a record. Its bytes lie in the file store under the farm and their digest. */
@Entity({ name: 'attachments' })
@Index('attachments_record_idx', ['farmId', 'recordId', 'uploadedAt', 'id'])
@ForeignKey('Person', ['farmId', 'uploadedById'], ['farmId', 'id'], { name: 'attachments_uploaded_by_fkey' })
@Check('attachments_kind_check', `kind IN ('photo', 'paper')`)
@Check('attachments_bytes_check', 'bytes > 0')
@Check('attachments_served_check', `(type = 'application/pdf') = (served_digest IS NULL AND served_bytes IS NULL AND width IS NULL AND height IS NULL)`)
export class Attachment {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'attachments_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'uuid', primaryKeyConstraintName: 'attachments_pkey' }) id!: string
  /** What it belongs to: a record, or one of those whose id then stands in `recordId`: a paper of a person, the land of a block, a calibration, a certificate. */
  @Column({ type: 'text', default: 'record' }) about!: 'record' | 'person-paper' | 'land' | 'calibration' | 'certificate'
  /** A record, or one that was discarded before it was signed: no key binds it. */
  @Column({ name: 'record_id', type: 'uuid' }) recordId!: string
  @Column({ type: 'text' }) kind!: 'photo' | 'paper'
  @Column({ type: 'text' }) label!: string
  @Column({ type: 'text' }) type!: 'image/jpeg' | 'image/png' | 'image/webp' | 'application/pdf'
  @Column({ type: 'integer' }) bytes!: number
  /** SHA-256 of the file as it was sent. */
  @Column({ type: 'text' }) digest!: string
  /** The picture as it is shown; all four null for a PDF. */
  @Column({ name: 'served_digest', type: 'text', nullable: true }) servedDigest!: string | null
  @Column({ name: 'served_bytes', type: 'integer', nullable: true }) servedBytes!: number | null
  @Column({ type: 'integer', nullable: true }) width!: number | null
  @Column({ type: 'integer', nullable: true }) height!: number | null
  /** As the camera's clock said. */
  @Column({ name: 'taken_at', type: 'timestamptz', nullable: true }) takenAt!: Date | null
  @Column({ name: 'uploaded_by_id', type: 'uuid' }) uploadedById!: string
  @Column({ name: 'uploaded_at', type: 'timestamptz' }) uploadedAt!: Date
  /** Of the record; null until that is signed, and so unseen by a certifier. */
  @Column({ type: 'integer', nullable: true }) season!: number | null
  /** First signed version that names it. */
  @Column({ name: 'signed_version', type: 'integer', nullable: true }) signedVersion!: number | null
  @Column({ name: 'removed_at', type: 'timestamptz', nullable: true }) removedAt!: Date | null
  @Column({ name: 'creation_digest', type: 'text' }) creationDigest!: string
}
