import type { Account } from '@cairnstep/contract';
import { useState } from 'react';
import { NavLink, useLocation } from 'react-router-dom';
import { navigationFor } from './audience.ts';

/** The pages this person can open. On narrow screens it folds behind one button; on wide ones a steward's thirteen fit one line. */
export function Navigation({ account }: { readonly account: Account | undefined }) {
  const { pathname } = useLocation();
  const [openAt, setOpenAt] = useState<string | null>(null);
  // Going somewhere closes it.
  const open = openAt === pathname;
  return (
    <nav aria-label="Pages" className="contents">
      <button
        type="button"
        aria-expanded={open}
        aria-controls="pages"
        onClick={() => setOpenAt(open ? null : pathname)}
        className="min-h-10 rounded-sm border border-edge px-4 font-semibold md:hidden"
      >
        {open ? 'Close' : 'Pages'}
      </button>
      <ul id="pages" className={`w-full ${open ? 'grid pt-2' : 'hidden'} md:order-2 md:flex md:flex-wrap md:gap-x-3.5 md:pt-2 md:pb-0`}>
        {navigationFor(account).map(({ path, nav }) => (
          <li key={path}>
            <NavLink
              to={path}
              end={path === '/'}
              className={({ isActive }) =>
                `block border-l-3 py-2 pl-3 md:border-b-3 md:border-l-0 md:pl-0 ${
                  isActive ? 'border-lichen font-semibold text-ink' : 'border-transparent text-quiet hover:text-ink hover:underline'
                }`
              }
            >
              {nav}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
