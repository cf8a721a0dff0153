/** Who is signed in and what they may do here; the theme; the way out. */
import type { Account } from '@cairnstep/contract';
import type { ReactNode } from 'react';
import { useEffect, useId, useRef, useState } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { signInAddress, signOut } from '../lib/account.ts';
import { roleWithin } from '../lib/role-names.ts';
import { chooseTheme, themes, useTheme } from '../lib/theme.ts';
import type { Theme } from '../lib/theme.ts';

export function AccountMenu({ account }: { readonly account: Account | undefined }) {
  const { pathname, search } = useLocation();
  const signedIn = account?.signedIn === true;
  const returnTo = pathname === '/' || pathname === '/sign-in' ? '/start' : pathname + search;
  return (
    <div className="relative flex w-full flex-wrap items-center justify-between gap-x-5 py-1 md:order-1 md:w-auto md:py-0">
      {account !== undefined && !signedIn && (
        <Link to={signInAddress(returnTo)} className="link font-semibold">
          Sign in
        </Link>
      )}
      <Foldout label={signedIn ? (account.name ?? 'Your account') : 'Appearance'}>
        {signedIn && <WhoIsIn account={account} />}
        <ThemeChoice />
        {signedIn && <SignOut />}
      </Foldout>
    </div>
  );
}

function WhoIsIn({ account }: { readonly account: Account }) {
  return (
    <div className="grid gap-1 border-b border-hairline pb-3">
      <p className="font-semibold">{account.name ?? 'Signed in'}</p>
      {account.institution !== null && <p className="text-small text-quiet">{account.institution}</p>}
      <ul className="text-small">
        {account.grants.map(({ id, role, site }) => (
          <li key={id}>{roleWithin(role, site)}</li>
        ))}
        {account.grants.length === 0 && <li>No role yet</li>}
      </ul>
    </div>
  );
}

const themeWords: Record<Theme, string> = { system: 'As the system', light: 'Light', dark: 'Dark' };

function ThemeChoice() {
  const theme = useTheme();
  const name = useId();
  return (
    <fieldset>
      <legend className="pb-1 text-small text-quiet">Appearance</legend>
      {themes.map((choice) => (
        <label key={choice} className="flex min-h-8 cursor-pointer items-center gap-3">
          <input
            type="radio"
            name={name}
            value={choice}
            checked={theme === choice}
            onChange={() => chooseTheme(choice)}
            className="size-4 accent-lichen"
          />
          {themeWords[choice]}
        </label>
      ))}
    </fieldset>
  );
}

function SignOut() {
  const [state, setState] = useState<'resting' | 'leaving' | 'failed'>('resting');
  async function leave(): Promise<void> {
    setState('leaving');
    try {
      window.location.assign(await signOut());
    } catch {
      setState('failed');
    }
  }
  return (
    <div className="border-t border-hairline pt-3">
      <button type="button" className="link font-semibold" disabled={state === 'leaving'} onClick={() => void leave()}>
        {state === 'leaving' ? 'Signing out…' : 'Sign out'}
      </button>
      {state === 'failed' && (
        <p role="alert" className="mt-2 border-l-4 border-oxide pl-2 text-small">
          Signing out did not work: the registry cannot be reached. You are still signed in. Try again, or close the browser.
        </p>
      )}
    </div>
  );
}

/** A button with a panel under it; Escape, a press elsewhere or leaving it with the keyboard closes it. */
function Foldout({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  const [open, setOpen] = useState(false);
  const box = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const panelId = useId();
  useEffect(() => {
    if (!open) return;
    const outside = (event: PointerEvent) => {
      if (event.target instanceof Node && box.current?.contains(event.target) === false) setOpen(false);
    };
    document.addEventListener('pointerdown', outside);
    return () => document.removeEventListener('pointerdown', outside);
  }, [open]);
  return (
    <div
      ref={box}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || !open) return;
        setOpen(false);
        button.current?.focus();
      }}
      onBlur={(event) => {
        if (event.relatedTarget instanceof Node && !event.currentTarget.contains(event.relatedTarget)) setOpen(false);
      }}
    >
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        aria-controls={panelId}
        onClick={() => setOpen(!open)}
        className="inline-flex min-h-10 items-center gap-2 text-ink"
      >
        {label}
        <svg aria-hidden="true" width="12" height="8" viewBox="0 0 12 8" fill="none" stroke="currentColor" strokeWidth="1.5">
          <path d={open ? 'M1 6.5 6 1.5 11 6.5' : 'M1 1.5 6 6.5 11 1.5'} />
        </svg>
      </button>
      <div
        id={panelId}
        hidden={!open}
        className="absolute inset-x-0 top-full z-20 rounded-sm border border-edge bg-sheet p-4 md:left-auto md:w-64"
      >
        <div className="grid gap-3">{children}</div>
      </div>
    </div>
  );
}
