/**
 * The preparing page within this one. It runs in a sandbox with an origin of its own and connects to nothing; what it has to say comes
 * as messages, and each is parsed before it is believed.
 */
import { useEffect, useEffectEvent, useMemo, useRef, useState } from 'react';
import { useTheme } from '../../lib/theme.ts';
import { FromPreparing } from '../../preparing/messages.ts';
import type { Sending, Task, ToPreparing } from '../../preparing/messages.ts';
import { Button } from '../../ui/button.tsx';
import { Loading } from '../../ui/loading.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';

const address = '/prepare.html';
// Vite's server hands out modules one by one, to its own origin alone.
const sandbox = `allow-scripts allow-downloads allow-forms${import.meta.env.DEV ? ' allow-same-origin' : ''}`;
const originOfFrame = import.meta.env.DEV ? window.location.origin : 'null';
const patience = 20_000;

/** What the page around it has to act on. */
export type PreparingAct = Exclude<FromPreparing, { kind: 'ready' | 'height' | 'unsaved' }>;

export interface PreparingFrameProps {
  /** For assistive technology: what is done in it. */
  readonly title: string;
  readonly task: Omit<Task, 'kind' | 'theme'>;
  readonly sending: Sending | null;
  readonly onUnsaved: (isUnsaved: boolean) => void;
  readonly onAct: (act: PreparingAct) => void;
}

type State = 'opening' | 'open' | 'silent' | 'not-understood';

export function PreparingFrame({ title, task, sending, onUnsaved, onAct }: PreparingFrameProps) {
  const frame = useRef<HTMLIFrameElement>(null);
  const [state, setState] = useState<State>('opening');
  const [height, setHeight] = useState(480);
  const theme = useTheme();
  const { view, site, month, knownParticipants, safeHeaders } = task;
  const message = useMemo<Task>(
    () => ({ kind: 'task', view, site, month, knownParticipants, safeHeaders, theme }),
    [view, site, month, knownParticipants, safeHeaders, theme],
  );

  const hear = useEffectEvent((event: MessageEvent<unknown>) => {
    if (event.source === null || event.source !== frame.current?.contentWindow || event.origin !== originOfFrame) return;
    const parsed = FromPreparing.safeParse(event.data);
    if (!parsed.success) return setState('not-understood');
    const said = parsed.data;
    switch (said.kind) {
      case 'ready':
        setState('open');
        say(frame.current, message);
        return;
      case 'height':
        return setHeight(said.pixels);
      case 'unsaved':
        return onUnsaved(said.isUnsaved);
      default:
        return onAct(said);
    }
  });
  useEffect(() => {
    const listen = (event: MessageEvent<unknown>) => hear(event);
    window.addEventListener('message', listen);
    return () => window.removeEventListener('message', listen);
  }, []);

  const isOpen = state === 'open';
  useEffect(() => {
    if (isOpen) say(frame.current, message);
  }, [isOpen, message]);
  useEffect(() => {
    if (isOpen && sending !== null) say(frame.current, sending);
  }, [isOpen, sending]);
  useEffect(() => {
    if (state !== 'opening') return;
    const timer = setTimeout(() => setState('silent'), patience);
    return () => clearTimeout(timer);
  }, [state]);

  if (state === 'not-understood') {
    return (
      <Section>
        <Notice kind="error" title="The preparing page said something that this page does not understand." urgent>
          <p>Nothing was sent. A newer version of the registry may be in service: load the page again and open the key file once more.</p>
          <Again />
        </Notice>
      </Section>
    );
  }
  return (
    <>
      {state === 'opening' && (
        <Section>
          <Loading>Opening the preparing page.</Loading>
        </Section>
      )}
      {state === 'silent' && (
        <Section>
          <Notice kind="error" title="The preparing page does not open." urgent>
            <p>
              Nothing was read and nothing was sent. A browser extension or an old browser can keep it from running. Load the page again, or
              use another browser.
            </p>
            <Again />
          </Notice>
        </Section>
      )}
      {/* Over the whole width of the sheet: it has a margin of its own, just where this page has it. */}
      <iframe
        ref={frame}
        src={address}
        title={title}
        sandbox={sandbox}
        referrerPolicy="no-referrer"
        hidden={!isOpen}
        className="relative block w-full border-0"
        style={{ height }}
      />
    </>
  );
}

/** A sandbox has no origin to address; the frame's own window is the only one that hears it. */
const say = (frame: HTMLIFrameElement | null, message: ToPreparing): void => frame?.contentWindow?.postMessage(message, '*');

function Again() {
  return (
    <div className="mt-3">
      <Button onPress={() => window.location.reload()}>Load the page again</Button>
    </div>
  );
}
