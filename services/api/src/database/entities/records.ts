import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** Append-only, hash-chained. */
@Entity('audit_entries')
@Index('audit_entries_prev_key', ['prev'], { unique: true })
@Index('audit_entries_actor_idx', ['actor'])
export class AuditEntryRow {
  @PrimaryColumn({ type: 'bigint' }) seq: string;
  @Column({ type: 'timestamptz', precision: 3 }) at: Date;
  @Column({ type: 'text' }) actor: string;
  @Column({ type: 'text' }) role: string;
  @Column({ type: 'text' }) act: string;
  @Column({ type: 'text', nullable: true }) object: string | null;
  @Column({ type: 'text' }) result: 'ok' | 'refused' | 'failed';
  /** The canonical JSON that was hashed. */
  @Column({ type: 'text' }) event: string;
  @Column({ type: 'text' }) prev: string;
  @Column({ type: 'text' }) hash: string;
}

/** One mail for one event; `event` is unique, so nothing is mailed twice. */
@Entity('mail_messages')
@Index('mail_messages_event_key', ['event'], { unique: true })
export class MailMessageRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) event: string;
  @Column({ type: 'text' }) recipient: string;
  @Column({ type: 'text' }) subject: string;
  @Column({ type: 'text' }) body: string;
  /** `sending` outlives only a crash between handing over and noting it: such a mail is not sent again. */
  @Column({ type: 'text', default: 'waiting' }) status: 'waiting' | 'sending' | 'sent' | 'failed';
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'timestamptz', name: 'sent_at', nullable: true }) sentAt: Date | null;
}
