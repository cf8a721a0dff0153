/** What the worker does with each thing it is asked. Lives as long as the page; nothing of it outlasts the page. */
import { generatePassphrase } from '@cairnstep/deidentification';
import { KeyDesk } from './key-desk.ts';
import { MonthDesk } from './month-desk.ts';
import type { Circumstances, Picture } from './protocol.ts';
import { Refusal } from './refusal.ts';
import type { Answers } from './serve.ts';
import { SourceShelf } from './source-shelf.ts';

interface Desks {
  readonly keys: KeyDesk;
  readonly month: MonthDesk;
  readonly shelf: SourceShelf;
}

export function workshop(): Answers {
  let desks: Desks | null = null;
  let known: Circumstances = { site: '', month: null, knownParticipants: null, safeHeaders: [], today: '' };

  function at(): Desks {
    if (desks === null) throw new Refusal('failed', 'The page has not said yet which site it is for.');
    return desks;
  }
  /** What was worked out before is no longer so. */
  function changed(): void {
    at().month.forget();
    at().keys.giveUpAddition();
  }
  const picture = (): Picture => ({ key: at().keys.picture(), ...at().shelf.picture() });
  const remembered = () => (at().keys.isOpen ? at().keys.key.matches : new Map<never, never>());

  return {
    begin: async (circumstances: Circumstances) => {
      if (desks === null || known.site !== circumstances.site)
        desks = { keys: new KeyDesk(() => known), month: new MonthDesk(() => known), shelf: new SourceShelf() };
      known = circumstances;
      return picture();
    },
    'suggest-passphrase': async () => generatePassphrase(),
    'make-key': async (settings) => {
      const file = await at().keys.make(settings);
      return { picture: picture(), file };
    },
    'open-key': async ({ file, passphrase }) => {
      await at().keys.open(file, passphrase);
      at().shelf.matchAgain(remembered());
      changed();
      return picture();
    },
    'merge-key': async ({ file, passphrase }) => {
      const merged = await at().keys.merge(file, passphrase);
      changed();
      return { picture: picture(), ...merged };
    },
    'rotate-key': async ({ recordNumbers }) => {
      const carriedOver = await at().keys.rotate(recordNumbers);
      changed();
      return { picture: picture(), carriedOver };
    },
    'join-numbers': async ({ kept, joined }) => {
      const done = await at().keys.join(kept, joined);
      changed();
      return { picture: picture(), ...done };
    },
    'change-passphrase': async ({ passphrase }) => {
      at().keys.changePassphrase(passphrase);
      return picture();
    },
    'save-key': async () => {
      const file = await at().keys.save();
      return { picture: picture(), file };
    },
    'codes-to-replace': async () => [...at().keys.codesToReplace],
    'codes-replaced': async () => {
      at().keys.forgetReplaced();
      return picture();
    },
    'add-files': async ({ files }, watch) => {
      changed();
      await at().shelf.add(files, remembered(), watch);
      return picture();
    },
    'change-source': async (change, watch) => {
      changed();
      await at().shelf.change(change, remembered(), watch);
      return picture();
    },
    'leave-out': async ({ id }) => {
      changed();
      at().shelf.leaveOut(id);
      return picture();
    },
    'match-column': async ({ source, match }) => {
      changed();
      at().shelf.match(source, match);
      return picture();
    },
    'state-first-day': async ({ date, ...place }) => {
      const { month, shelf, keys } = at();
      month.state(shelf.assigned, keys.key, place, date);
      changed();
      return picture();
    },
    prepare: async (_, watch) => {
      const { month, shelf, keys } = at();
      watch.tell({ what: 'Working out what would be sent', bytes: null });
      const { picture: prepared, month: result } = await month.prepare(shelf.assigned, keys.key, (code) => keys.wasMetHere(code));
      keys.add({ key: result.key, replaced: result.replacedCodes });
      return { picture: picture(), prepared };
    },
    'tables-to-send': async () => ({ tables: at().month.tablesToSend(), replacedCodes: [...at().keys.codesToReplace] }),
  };
}
