import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A clinic that fills the registry. `revision` grows with every accepted submission; a preview is bound to it. */
@Entity('sites')
export class SiteRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Index('sites_code_key', { unique: true }) @Column({ type: 'text' }) code: string;
  @Column({ type: 'text' }) name: string;
  /** First month the site submits. */
  @Column({ type: 'text', name: 'first_month' }) firstMonth: string;
  @Column({ type: 'integer', default: 0 }) revision: number;
}

/** A person known by (issuer, subject) of an identity provider. Disabled, never deleted. */
@Entity('accounts')
@Index('accounts_identity_key', ['issuer', 'subject'], { unique: true })
export class AccountRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) issuer: string;
  @Column({ type: 'text' }) subject: string;
  @Column({ type: 'text' }) name: string;
  /** Contact data only; never used to recognise anyone. */
  @Column({ type: 'text', nullable: true }) email: string | null;
  @Column({ type: 'text', nullable: true }) institution: string | null;
  @Column({ type: 'text', default: 'active' }) status: 'active' | 'disabled';
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'timestamptz', name: 'last_sign_in_at', nullable: true }) lastSignInAt: Date | null;
}

/** A role from a day to a day (both inclusive), read at every request. */
@Entity('grants')
@Index('grants_account_idx', ['accountId'])
export class GrantRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid', name: 'account_id' }) accountId: string;
  @Column({ type: 'text' }) role: string;
  @Column({ type: 'uuid', name: 'site_id', nullable: true }) siteId: string | null;
  @Column({ type: 'date', name: 'starts_on' }) startsOn: string;
  @Column({ type: 'date', name: 'ends_on', nullable: true }) endsOn: string | null;
  @Column({ type: 'uuid', name: 'given_by', nullable: true }) givenBy: string | null;
}

/** An offer of a role, sent by mail. Only the hash of its token is kept. Binds to whoever signs in with it first. */
@Entity('invitations')
@Index('invitations_token_key', ['tokenHash'], { unique: true })
export class InvitationRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'text' }) email: string;
  @Column({ type: 'text' }) role: string;
  @Column({ type: 'uuid', name: 'site_id', nullable: true }) siteId: string | null;
  @Column({ type: 'date', name: 'grant_ends_on', nullable: true }) grantEndsOn: string | null;
  @Column({ type: 'text', name: 'token_hash' }) tokenHash: string;
  @Column({ type: 'uuid', name: 'invited_by' }) invitedBy: string;
  @Column({ type: 'timestamptz', name: 'created_at', default: () => 'now()' }) createdAt: Date;
  @Column({ type: 'timestamptz', name: 'expires_at' }) expiresAt: Date;
  @Column({ type: 'timestamptz', name: 'accepted_at', nullable: true }) acceptedAt: Date | null;
  @Column({ type: 'uuid', name: 'accepted_by', nullable: true }) acceptedBy: string | null;
  @Column({ type: 'timestamptz', name: 'revoked_at', nullable: true }) revokedAt: Date | null;
}

/** A site's own system, known by (issuer, subject) of its access tokens. Submits for its site. Disabled, never deleted. */
@Entity('site_systems')
@Index('site_systems_identity_key', ['issuer', 'subject'], { unique: true })
export class SiteSystemRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Column({ type: 'uuid', name: 'site_id' }) siteId: string;
  @Column({ type: 'text' }) issuer: string;
  @Column({ type: 'text' }) subject: string;
  /** Stands where a person's name would. */
  @Column({ type: 'text' }) label: string;
  @Column({ type: 'text', default: 'active' }) status: 'active' | 'disabled';
  /** Null: the registry itself, for the demonstration. */
  @Column({ type: 'uuid', name: 'added_by', nullable: true }) addedBy: string | null;
  @Column({ type: 'timestamptz', name: 'added_at', default: () => 'now()' }) addedAt: Date;
  @Column({ type: 'timestamptz', name: 'last_used_at', nullable: true }) lastUsedAt: Date | null;
}

/** Sign-in sessions of the browser (connect-pg-simple's shape). */
@Entity('web_sessions')
@Index('web_sessions_expire_idx', ['expire'])
export class WebSessionRow {
  @PrimaryColumn({ type: 'text' }) sid: string;
  @Column({ type: 'json' }) sess: object;
  @Column({ type: 'timestamp', precision: 6 }) expire: Date;
}
