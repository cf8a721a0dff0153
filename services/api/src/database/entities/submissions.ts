import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity('submissions')
@Index('submissions_site_month_idx', ['siteId', 'month'])
export class SubmissionRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text' }) month: string;
  @Column({ type: 'text' }) status: 'open' | 'checking' | 'checked' | 'accepted' | 'superseded' | 'discarded';
  @Column({ type: 'uuid', name: 'created_by' }) createdBy: string;
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'uuid', name: 'settled_by', nullable: true }) settledBy: string | null;
  @Column({ type: 'timestamptz', name: 'settled_at', nullable: true }) settledAt: Date | null;
  /** {step, done, of} while checking. */
  @Column({ type: 'jsonb', nullable: true }) progress: object | null;
  /** Groups of findings by rule with counts and acknowledgements, written by the check. */
  @Column({ type: 'jsonb' }) findings: object;
  /** Counts per table and what the preview was computed against; null until checked without errors. */
  @Column({ type: 'jsonb', nullable: true }) preview: object | null;
  @Column({ type: 'text', name: 'preview_digest', nullable: true }) previewDigest: string | null;
  /** The site's revision when the preview was made. */
  @Column({ type: 'integer', name: 'site_revision', nullable: true }) siteRevision: number | null;
  @Column({ type: 'jsonb', nullable: true }) receipt: object | null;
  /** Reasons given for warnings of an earlier check, while the next one has not been made. */
  @Column({ type: 'jsonb', nullable: true }) reasons: object | null;
}

@Entity('submission_files')
export class SubmissionFileRow {
  @PrimaryColumn({ type: 'uuid', name: 'submission_id' }) submissionId: string;
  /** The table of a CSV file; `workbook` for the workbook. */
  @PrimaryColumn({ type: 'text', name: 'table_key' }) tableKey: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text', name: 'file_name' }) fileName: string;
  @Column({ type: 'integer' }) bytes: number;
  @Column({ type: 'text' }) sha256: string;
  @Column({ type: 'timestamptz', name: 'added_at', default: () => 'now()' }) addedAt: Date;
  @Column({ type: 'integer', nullable: true }) rows: number | null;
  /** The file as sent, until the submission is settled. */
  @Column({ type: 'bytea', nullable: true }) content: Buffer | null;
  /** What the file has rows of; of a workbook known after the check. */
  @Column({ type: 'text', array: true, nullable: true }) tables: string[] | null;
  /** It identified somebody or could not be read to its end, and was deleted. */
  @Column({ type: 'boolean', default: false }) refused: boolean;
  /** Cells mended on screen. */
  @Column({ type: 'integer', default: 0 }) mended: number;
  /** Over those cells; null when there are none. */
  @Column({ type: 'text', name: 'mends_digest', nullable: true }) mendsDigest: string | null;
}

/** A cell typed in place of one in a file, until the submission is settled. */
@Entity('submission_mends')
export class SubmissionMendRow {
  @PrimaryColumn({ type: 'uuid', name: 'submission_id' }) submissionId: string;
  @PrimaryColumn({ type: 'text', name: 'table_key' }) tableKey: string;
  @PrimaryColumn({ type: 'integer' }) line: number;
  @PrimaryColumn({ type: 'text', name: 'column_key' }) columnKey: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text' }) value: string;
}

/** A header that screening would refuse and that means something harmless in the files of one site. Its cells are screened all the same. */
@Entity('safe_headers')
export class SafeHeaderRow {
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text' }) header: string;
  @Column({ type: 'uuid', name: 'marked_by' }) markedBy: string;
  @Column({ type: 'timestamptz', name: 'marked_at', default: () => 'now()' }) markedAt: Date;
}

@Entity('submission_findings')
export class SubmissionFindingRow {
  @PrimaryColumn({ type: 'uuid', name: 'submission_id' }) submissionId: string;
  @PrimaryColumn({ type: 'integer' }) ordinal: number;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text' }) rule: string;
  @Column({ type: 'text' }) severity: 'error' | 'warning';
  /** Null when about a whole workbook. */
  @Column({ type: 'text', name: 'table_key', nullable: true }) tableKey: string | null;
  @Column({ type: 'integer', nullable: true }) line: number | null;
  @Column({ type: 'text', name: 'column_key', nullable: true }) columnKey: string | null;
  @Column({ type: 'text' }) found: string;
  @Column({ type: 'text' }) mend: string;
}

/** Every earlier value of a row that a submission changed or removed. */
@Entity('row_history')
@Index('row_history_row_idx', ['siteId', 'tableKey', 'rowKey'])
export class RowHistoryRow {
  @PrimaryColumn({ type: 'bigint', generated: 'identity' }) id: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text', name: 'table_key' }) tableKey: string;
  @Column({ type: 'jsonb', name: 'row_key' }) rowKey: object;
  @Column({ type: 'text' }) change: 'changed' | 'removed';
  /** The row as it was before. */
  @Column({ type: 'jsonb' }) before: object;
  /** The submission that changed or removed it. */
  @Column({ type: 'uuid', name: 'submission_id' }) submissionId: string;
  @Column({ type: 'timestamptz', name: 'changed_at', default: () => 'now()' }) changedAt: Date;
}
