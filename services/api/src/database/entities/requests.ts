import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity('access_requests')
@Index('access_requests_number_key', ['number'], { unique: true })
export class AccessRequestRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) number: string;
  @Column({ type: 'text' }) status: string;
  @Column({ type: 'integer', default: 1 }) version: number;
  @Column({ type: 'uuid', name: 'lead_id' }) leadId: string;
  @Column({ type: 'jsonb' }) form: object;
  /** SHA-256 over number, version and form: what a vote is bound to. */
  @Column({ type: 'text', name: 'version_hash' }) versionHash: string;
  @Column({ type: 'integer', name: 'votes_needed', default: 1 }) votesNeeded: number;
  @Column({ type: 'jsonb', name: 'votes_needed_because' }) votesNeededBecause: object;
  @Column({ type: 'integer', name: 'release_number', nullable: true }) releaseNumber: number | null;
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'timestamptz', name: 'updated_at', default: () => 'now()' }) updatedAt: Date;
  @Column({ type: 'timestamptz', name: 'submitted_at', nullable: true }) submittedAt: Date | null;
  @Column({ type: 'timestamptz', name: 'decided_at', nullable: true }) decidedAt: Date | null;
  @Column({ type: 'date', name: 'access_ends_on', nullable: true }) accessEndsOn: string | null;
}

@Entity('access_request_members')
@Index('access_request_members_account_idx', ['accountId'])
export class AccessRequestMemberRow {
  @PrimaryColumn({ type: 'uuid', name: 'request_id' }) requestId: string;
  @PrimaryColumn({ type: 'uuid', name: 'account_id' }) accountId: string;
}

@Entity('access_request_votes')
export class AccessRequestVoteRow {
  @PrimaryColumn({ type: 'uuid', name: 'request_id' }) requestId: string;
  @PrimaryColumn({ type: 'integer' }) version: number;
  @PrimaryColumn({ type: 'uuid', name: 'steward_id' }) stewardId: string;
  @Column({ type: 'text' }) vote: 'approve' | 'decline';
  @Column({ type: 'text' }) reason: string;
  @Column({ type: 'text', name: 'version_hash' }) versionHash: string;
  @Column({ type: 'timestamptz', name: 'voted_at', default: () => 'now()' }) votedAt: Date;
}

@Entity('exports')
@Index('exports_number_key', ['number'], { unique: true })
@Index('exports_request_idx', ['requestId'])
export class ExportRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) number: string;
  @Column({ type: 'uuid', name: 'request_id' }) requestId: string;
  @Column({ type: 'uuid', name: 'requested_by' }) requestedBy: string;
  @Column({ type: 'text' }) status: 'building' | 'ready' | 'failed' | 'stale';
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'timestamptz', name: 'built_at', nullable: true }) builtAt: Date | null;
  @Column({ type: 'integer', nullable: true }) participants: number | null;
  @Column({ type: 'text', nullable: true }) sha256: string | null;
  @Column({ type: 'bytea', nullable: true }) content: Buffer | null;
}

/** Which participant hides behind which pseudonym of an export: needed to honour withdrawals, readable by the registry alone. */
@Entity('export_pseudonyms')
export class ExportPseudonymRow {
  @PrimaryColumn({ type: 'uuid', name: 'export_id' }) exportId: string;
  @PrimaryColumn({ type: 'text' }) pseudonym: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text' }) participant: string;
}
