import { NavLink } from 'react-router-dom';
import { classNames } from './class-names';

export interface SectionLink {
  to: string;
  label: string;
  /** Only the exact address counts as here. */
  end?: boolean;
  /** A count or short word beside the label. */
  note?: string;
}

/** The sections of one thing; the one being read is underlined in copper. */
export function SectionNav({ label, links }: { label: string; links: readonly SectionLink[] }) {
  return (
    <nav aria-label={label} className="flex min-w-0 items-stretch overflow-x-auto">
      <ul className="flex items-stretch gap-5">
        {links.map((link) => (
          <li key={link.to} className="flex">
            <NavLink
              to={link.to}
              end={link.end ?? false}
              className={({ isActive }) =>
                classNames(
                  'flex min-h-8 items-center gap-1.5 border-b-2 whitespace-nowrap no-underline -outline-offset-2 touch:min-h-11',
                  isActive ? 'border-copper text-ink' : 'border-transparent text-muted hover:text-ink',
                )
              }
            >
              {link.label}
              {link.note ? <span className="figure text-sm text-muted">{link.note}</span> : null}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
