import { Link } from 'react-router-dom';

export interface Crumb {
  label: string;
  to?: string;
}

/** Survey / line / sounding; the last one is where the reader stands. */
export function Breadcrumb({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="min-w-0">
      <ol className="flex min-w-0 items-center">
        {crumbs.map((crumb, index) => {
          const last = index === crumbs.length - 1;
          return (
            <li
              key={`${crumb.to ?? ''}${crumb.label}`}
              className={last ? 'flex min-w-0 items-center' : 'hidden min-w-0 items-center sm:flex'}
            >
              {crumb.to === undefined || last ? (
                <span
                  aria-current={last ? 'page' : undefined}
                  className={`truncate ${last ? 'font-semibold' : 'text-muted'}`}
                >
                  {crumb.label}
                </span>
              ) : (
                <Link
                  to={crumb.to}
                  className="flex min-h-6 items-center truncate no-underline hover:underline touch:min-h-11"
                >
                  {crumb.label}
                </Link>
              )}
              {last ? null : (
                <span aria-hidden className="px-2 text-muted">
                  /
                </span>
              )}
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
