import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

@Entity({ name: 'farm_heads' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'farm_heads_farm_fkey' })
export class FarmHead {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'farm_heads_pkey' }) farmId!: string
  /** Last entry of the evidence log; its row lock makes the log gapless. */
  @Column({ name: 'last_seq', type: 'integer', default: 0 }) lastSeq!: number
}
