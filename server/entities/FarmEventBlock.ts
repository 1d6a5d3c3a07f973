import { Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'

/** A block that an event of the farm was on. */
@Entity({ name: 'farm_event_blocks' })
@Index('farm_event_blocks_block_idx', ['farmId', 'blockId'])
@ForeignKey('FarmEvent', ['farmId', 'eventId'], ['farmId', 'id'], { name: 'farm_event_blocks_event_fkey' })
@ForeignKey('Block', ['farmId', 'blockId'], ['farmId', 'id'], { name: 'farm_event_blocks_block_fkey' })
export class FarmEventBlock {
  @PrimaryColumn({ name: 'farm_id', type: 'uuid', primaryKeyConstraintName: 'farm_event_blocks_pkey' }) farmId!: string
  @PrimaryColumn({ name: 'event_id', type: 'uuid', primaryKeyConstraintName: 'farm_event_blocks_pkey' }) eventId!: string
  @PrimaryColumn({ name: 'block_id', type: 'uuid', primaryKeyConstraintName: 'farm_event_blocks_pkey' }) blockId!: string
}
