import { useEffect, useRef } from 'react';
import { NavLink, useLocation } from 'react-router-dom';
import { classNames } from '#client/src/lib/class-names.ts';

interface TabLinksProps {
  readonly label: string;
  readonly tabs: readonly { readonly to: string; readonly label: string; readonly count?: number }[];
}

/** Sections of one thing, each with an address of its own. */
export function TabLinks({ label, tabs }: TabLinksProps) {
  const nav = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  useEffect(() => {
    const current = nav.current?.querySelector<HTMLElement>('[aria-current]');
    if (current && nav.current) nav.current.scrollLeft = Math.max(0, current.offsetLeft - 24);
  }, [pathname]);
  return (
    <nav ref={nav} aria-label={label} className="flex gap-6 overflow-x-auto border-b border-ink print:hidden">
      {tabs.map((tab) => (
        <NavLink
          key={tab.to}
          to={tab.to}
          className={({ isActive }) =>
            classNames(
              'shrink-0 border-b-3 px-0.5 pt-1 pb-1.5 -outline-offset-2',
              isActive ? 'border-steel font-semibold' : 'border-transparent text-muted hover:text-ink',
            )
          }
        >
          {tab.label}
          {tab.count !== undefined && <span className="num ml-1.5 text-muted">{tab.count}</span>}
        </NavLink>
      ))}
    </nav>
  );
}
