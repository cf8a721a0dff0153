import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A month in which the site had nothing to report. A submission accepted later counts instead. */
@Entity('month_closures')
export class MonthClosureRow {
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text' }) month: string;
  @Column({ type: 'uuid', name: 'closed_by' }) closedBy: string;
  @Column({ type: 'timestamptz', name: 'closed_at' }) closedAt: Date;
}
