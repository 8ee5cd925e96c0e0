import { Fragment, useContext, useEffect } from 'react';
import { createPortal } from 'react-dom';
import { Link } from 'react-router-dom';
import { CrumbsContext } from '#client/src/lib/crumbs-context.ts';

export interface Crumb {
  readonly label: string;
  /** Absent for the page itself, the last one. */
  readonly to?: string;
}

/** Writes the page's trail into the top bar and its name into the window's title. */
export function PageCrumbs({ crumbs }: { readonly crumbs: readonly Crumb[] }) {
  const slot = useContext(CrumbsContext);
  const title = crumbs
    .map((crumb) => crumb.label)
    .reverse()
    .join(' · ');
  useEffect(() => {
    document.title = title === '' ? 'Fairweight' : `${title} · Fairweight`;
  }, [title]);
  if (slot === null) return null;
  return createPortal(
    crumbs.map((crumb, i) => (
      <Fragment key={`${i}-${crumb.label}`}>
        {i > 0 && (
          <li aria-hidden="true" className="text-muted">
            /
          </li>
        )}
        <li className="min-w-0 truncate">
          {crumb.to === undefined ? (
            <span aria-current="page" className="font-semibold">
              {crumb.label}
            </span>
          ) : (
            <Link to={crumb.to} className="text-muted hover:text-ink hover:underline">
              {crumb.label}
            </Link>
          )}
        </li>
      </Fragment>
    )),
    slot,
  );
}
