/**
 * `node dist/demo/seed.js`: fills an empty registry with the invented demonstration data, through the same check and commit as a clinic's
 * own month. In a filled one it only lets the demonstration's people and systems in under the local provider's present address.
 */
import { createHash, randomUUID } from 'node:crypto';
import { mkdir, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { adoptCodes, createKeyFile, generatePassphrase, saveKeyFile } from '@cairnstep/deidentification';
import {
  demoCsv,
  demoRegistry,
  demoSeed,
  type ClinicMonth,
  type DemoFiles,
  type DemoMonth,
  type DemoRegistry,
  type DemoSite,
} from '@cairnstep/demo-data';
import { tableKeys, type TableKey } from '@cairnstep/dictionary';
import { demonstrationPeople, demonstrationSystems } from '@cairnstep/fake-oidc/demonstration-people';
import { pino } from 'pino';
import { recordAudit } from '../audit/record-audit.ts';
import { registry, type Person } from '../authority/actor.ts';
import { requireSubmitter } from '../authority/require-may.ts';
import { readConfig } from '../config.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';
import { makeDataSource } from '../database/data-source.ts';
import { freeze } from '../features/explore/make-release.ts';
import { checkSubmission } from '../features/submissions/check-submission.ts';
import { accept } from '../features/submissions/commit-submission.ts';
import { monthOf } from '../features/months/months.ts';
import { insertSystem } from '../features/site-systems/site-systems.repository.ts';
import { beginCheck, insertSubmission, lockSubmission, putFile, setFindingGroups } from '../features/submissions/submissions.repository.ts';

const monthBefore = (month: string): string => monthOf(new Date(Date.parse(`${month}-01T00:00:00Z`) - 86_400_000));

interface SeededSite extends DemoSite {
  readonly id: string;
  readonly coordinator: Person;
}

/** A clinic without a demonstration account still needs someone whose months these were. */
const absentCoordinator = (site: DemoSite) => ({
  subject: `demo-absent-${site.code}`,
  name: `Coordinator of ${site.name}`,
  email: null,
  institution: site.name,
});

async function addAccount(
  context: Context,
  person: { subject: string; name: string; email: string | null; institution: string },
  role: string | null,
  siteId: string | null,
): Promise<string> {
  const id = randomUUID();
  await asActor(context.database, registry, async (tx) => {
    await tx.query('insert into accounts (id, issuer, subject, name, email, institution) values ($1, $2, $3, $4, $5, $6)', [
      id,
      context.config.OIDC_ISSUER,
      person.subject,
      person.name,
      person.email,
      person.institution,
    ]);
    if (role !== null) {
      await tx.query("insert into grants (id, account_id, role, site_id, starts_on) values ($1, $2, $3, $4, date '2024-01-01')", [
        randomUUID(),
        id,
        role,
        siteId,
      ]);
    }
    await recordAudit(tx, registry, { act: 'account.demonstration', object: id });
  });
  return id;
}

async function addSites(context: Context, sites: readonly DemoSite[]): Promise<Map<string, SeededSite>> {
  const seeded = new Map<string, SeededSite>();
  for (const site of sites) {
    const id = randomUUID();
    await asActor(context.database, registry, (tx) =>
      tx.query('insert into sites (id, code, name, first_month) values ($1, $2, $3, $4)', [id, site.code, site.name, site.firstMonth]),
    );
    const known = demonstrationPeople.find((person) => person.role === 'coordinator' && person.site === site.code);
    const person = known ?? absentCoordinator(site);
    const accountId = await addAccount(context, person, 'coordinator', id);
    const coordinator: Person = {
      kind: 'person',
      accountId,
      name: person.name,
      institution: person.institution,
      grants: [{ id: randomUUID(), role: 'coordinator', siteId: id }],
    };
    seeded.set(site.code, { ...site, id, coordinator });
  }
  for (const person of demonstrationPeople) {
    if (person.role === 'coordinator') continue;
    await addAccount(context, person, person.role, person.site === null ? null : (seeded.get(person.site)?.id ?? null));
  }
  return seeded;
}

async function addSystems(context: Context, sites: ReadonlyMap<string, SeededSite>): Promise<void> {
  for (const { clientId, label, site } of demonstrationSystems) {
    const siteId = sites.get(site)?.id;
    if (siteId === undefined) throw new Error('A system names a site that is not there.');
    const id = randomUUID();
    await asActor(context.database, registry, async (tx) => {
      await insertSystem(tx, { id, siteId, issuer: context.config.OIDC_ISSUER, subject: clientId, label, addedBy: null });
      await recordAudit(tx, registry, { act: 'site-system.add', object: id, site: siteId });
    });
  }
}

/** The month's files, in the dictionary's order of tables. */
const filesOf = ({ tables }: DemoMonth): { table: TableKey; content: Buffer }[] =>
  tableKeys.flatMap((table) => {
    const rows = tables[table];
    return rows ? [{ table, content: Buffer.from(demoCsv(table, rows)) }] : [];
  });

/** Read, checked and committed as any month; warnings get a reason, an error ends the seeding. */
async function submit(context: Context, site: SeededSite, month: DemoMonth): Promise<void> {
  const { database, clock } = context;
  const id = await asActor(database, site.coordinator, async (tx) => {
    const submission = await insertSubmission(tx, site.id, month.month, site.coordinator.accountId);
    for (const { table, content } of filesOf(month)) {
      await putFile(tx, submission, site.id, {
        table,
        fileName: `${table}.csv`,
        sha256: createHash('sha256').update(content).digest('hex'),
        content,
      });
    }
    await beginCheck(tx, submission, clock());
    return submission;
  });
  await checkSubmission(context, id);
  await asActor(database, site.coordinator, async (tx) => {
    const submission = await lockSubmission(tx, id);
    if (!submission?.previewDigest)
      throw new Error(
        `The demonstration month ${month.month} of ${site.code} has errors: ${submission?.findings.map((group) => group.rule).join(', ')}`,
      );
    const findings = submission.findings.map((group) => ({
      ...group,
      acknowledgedReason: 'Compared with the record at the clinic; correct.',
    }));
    await setFindingGroups(tx, id, findings);
    await accept(tx, requireSubmitter(site.coordinator), { ...submission, findings }, submission.previewDigest, clock());
    await recordAudit(tx, site.coordinator, { act: 'submission.commit', object: id, site: site.id, detail: { month: month.month } });
  });
}

/** The next month of two clinics, to try an upload with: one without a mistake, one with many. */
async function writeFiles(folder: string, files: DemoFiles): Promise<void> {
  await mkdir(folder, { recursive: true });
  for (const [table, bytes] of Object.entries(files)) await writeFile(path.join(folder, `${table}.csv`), bytes);
}

/** The site key that the demonstration's first clinic would have by now, with its passphrase beside it, as nobody should keep it. */
async function writeSiteKey(folder: string, people: ClinicMonth['people']): Promise<void> {
  const passphrase = generatePassphrase();
  const { key } = await createKeyFile({ site: 'S01', keyId: 'demonstration' }, passphrase);
  const known = await adoptCodes(
    key,
    people.map(({ recordNumber, ...person }) => ({ localId: recordNumber, ...person })),
  );
  const { file } = await saveKeyFile(known, passphrase);
  await writeFile(path.join(folder, 'S01-site-key.json'), file);
  await writeFile(path.join(folder, 'passphrase.txt'), `${passphrase}\n`);
}

async function writeExamples(folder: string, next: DemoRegistry['next'], month: string): Promise<void> {
  await writeFiles(path.join(folder, `S01-${month}-clean`), next.clean);
  await writeFiles(path.join(folder, `S02-${month}-with-mistakes`), next.mistakes);
  const fromTheClinic = path.join(folder, `S01-${month}-from-the-clinic`);
  await writeFiles(fromTheClinic, next.fromTheClinic.files);
  await writeSiteKey(fromTheClinic, next.fromTheClinic.people);
}

const config = readConfig(process.env);
const database = await makeDataSource({ url: config.DATABASE_APP_URL, poolSize: 3 }).initialize();
const context: Context = { config, database, log: pino({ level: 'silent' }), clock: () => new Date() };
try {
  const [{ sites }] = await asActor(
    database,
    registry,
    async (tx) => (await tx.query('select count(*)::int as sites from sites')) as [{ sites: number }],
  );
  if (sites > 0) {
    for (const table of ['accounts', 'site_systems']) {
      await asActor(database, registry, (tx) =>
        tx.query(`update ${table} set issuer = $1 where subject like 'demo-%' and issuer <> $1`, [config.OIDC_ISSUER]),
      );
    }
  } else {
    const nextMonth = monthBefore(monthOf(context.clock()));
    const demo = demoRegistry({ seed: demoSeed, lastMonth: monthBefore(nextMonth) });
    const seeded = await addSites(context, demo.sites);
    await addSystems(context, seeded);
    for (const month of demo.months()) {
      const site = seeded.get(month.site);
      if (!site) throw new Error('A month names a site that is not there.');
      await submit(context, site, month);
    }
    await asActor(database, registry, async (tx) => {
      const release = await freeze(tx, null, 'First release of the demonstration data');
      await recordAudit(tx, registry, { act: 'release.make', object: `release ${release.number}`, detail: { digest: release.digest } });
    });
    const folder = process.env['EXAMPLE_FILES'];
    if (folder) await writeExamples(folder, demo.next, nextMonth);
  }
} finally {
  await database.destroy();
}
