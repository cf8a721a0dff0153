/** What stands around every page: the name, the ways to go, the account, the cautions. */
import { useEffect, useRef } from 'react';
import { Link, Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';
import { useAccount } from '../lib/account.ts';
import { Announcer } from '../ui/announcer.tsx';
import { Mark } from '../ui/mark.tsx';
import { AccountMenu } from './account-menu.tsx';
import { Cautions } from './cautions.tsx';
import { Navigation } from './navigation.tsx';

export function Frame() {
  const account = useAccount();
  const main = useFocusOnArrival();
  // The page itself says so before the account is known (serve-web.ts of the API).
  const isDemonstration = account?.demonstration ?? document.documentElement.hasAttribute('data-demonstration');
  const arriving = useNavigation().state === 'loading';
  return (
    <div className="mx-auto flex min-h-dvh max-w-[1200px] flex-col">
      <a
        href="#main"
        className="not-printed sr-only rounded-sm bg-sheet font-semibold text-lake focus:not-sr-only focus:absolute focus:px-4 focus:py-2 focus:top-2 focus:left-2 focus:z-30"
      >
        Skip to the content
      </a>
      {/* On paper only the label stays: nobody may take invented rows for real ones. */}
      <header>
        {isDemonstration && (
          <p className="border-b border-hairline px-4 py-1 text-small md:px-8">
            <strong className="font-semibold text-amber">Demonstration: invented data.</strong> No person, clinic or result here is real.
          </p>
        )}
        <div className="not-printed flex flex-wrap items-center justify-between gap-x-6 px-4 pt-4 md:px-8">
          <Link to="/" className="flex items-center gap-3 text-ink">
            <Mark size={36} />
            <span className="text-section leading-none font-bold tracking-tight">Cairnstep</span>
          </Link>
          <Navigation account={account} />
          <AccountMenu account={account} />
        </div>
      </header>
      {/* While something is being fetched the footer stands below the window, so that what arrives does not push it away. */}
      <main
        ref={main}
        id="main"
        tabIndex={-1}
        aria-busy={arriving}
        className="sheet flex-1 border-y border-hairline bg-sheet has-[[data-waiting]]:min-h-dvh lg:border-x"
      >
        <Outlet />
      </main>
      <footer className="not-printed px-4 py-6 text-small text-quiet md:px-8">
        <Cautions />
      </footer>
      <Announcer />
      <ScrollRestoration />
    </div>
  );
}

/** A new page takes the focus, so that the keyboard and a screen reader begin where its content begins. */
function useFocusOnArrival() {
  const main = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const shown = useRef(pathname);
  useEffect(() => {
    if (shown.current === pathname) return;
    shown.current = pathname;
    main.current?.focus({ preventScroll: true });
  }, [pathname]);
  return main;
}
