/** The bytes of a file, kept until it is checked. */
import { randomBytes } from 'node:crypto';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { readContent } from '../../services/api/src/features/submissions/read-content.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
});
afterAll(() => server.close());

const piece = 1 << 20;

describe('a file that is no text', () => {
  it.each([0, 1, 70_000, piece - 1, piece, piece + 1, 3 * piece + 7])('of %d bytes comes back as it was sent', async (length) => {
    const { body } = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201);
    const sent = randomBytes(length);
    await coordinator.upload(`/api/submissions/${body.id}/files/bouts?fileName=bouts.csv`, sent).expect(200);
    const back: Uint8Array[] = [];
    await asActor(server.context.database, registry, async (tx) => {
      for await (const bytes of readContent(tx, body.id, 'bouts')) {
        // Whoever reads takes its time, while the next piece arrives.
        await wait(5);
        back.push(bytes);
      }
    });
    expect(Buffer.concat(back).equals(sent)).toBe(true);
  });

  it('may be read in part; its connection goes on', async () => {
    const { body } = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201);
    await coordinator.upload(`/api/submissions/${body.id}/files/bouts?fileName=bouts.csv`, randomBytes(3 * piece)).expect(200);
    const after = await asActor(server.context.database, registry, async (tx) => {
      for await (const bytes of readContent(tx, body.id, 'bouts')) {
        expect(bytes.length).toBeGreaterThan(0);
        break;
      }
      return (await tx.query('select 1 as one')) as unknown;
    });
    expect(after).toEqual([{ one: 1 }]);
  });

  it('is empty when nobody sent it', async () => {
    const { body } = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201);
    const pieces = await asActor(server.context.database, registry, async (tx) => {
      const all = [];
      for await (const bytes of readContent(tx, body.id, 'consents')) all.push(bytes);
      return all;
    });
    expect(pieces).toEqual([]);
  });
});
