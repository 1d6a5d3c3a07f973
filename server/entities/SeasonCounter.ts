import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'

@Entity({ name: 'season_counters' })
@ForeignKey('Farm', ['farmId'], ['id'], { name: 'season_counters_farm_fkey' })
export class SeasonCounter {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'season_counters_pkey' }) farmId!: string
  @PrimaryColumn({ type: 'integer', primaryKeyConstraintName: 'season_counters_pkey' }) season!: number
  @Column({ name: 'last_number', type: 'integer', default: 0 }) lastNumber!: number
}
