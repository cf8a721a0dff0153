import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A participant code that is no more, and the one its person has today. */
@Entity('replaced_codes')
@Index('replaced_codes_to_idx', ['siteId', 'toCode'])
export class ReplacedCodeRow {
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text', name: 'from_code' }) fromCode: string;
  @Column({ type: 'text', name: 'to_code' }) toCode: string;
  @Column({ type: 'uuid', name: 'replaced_by' }) replacedBy: string;
  @Column({ type: 'timestamptz', name: 'replaced_at' }) replacedAt: Date;
}
