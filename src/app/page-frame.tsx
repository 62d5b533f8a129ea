import type { ReactNode } from 'react';
import type { Crumb } from '../ui/breadcrumb';
import type { SectionLink } from '../ui/section-nav';
import { FrameHeader } from './frame-header';

export interface PageFrameProps {
  /** Of the document, most particular part first: "S-07, Bench". */
  title: string;
  /** Survey / line / sounding. */
  crumbs?: readonly Crumb[];
  /** Sections of the survey or sounding that is open. */
  nav?: readonly SectionLink[];
  navLabel?: string;
  /** A few words on the state of the work, as "readings revision 3, all sent". */
  status?: ReactNode;
  /** Keys of this page, at the left of the footer. */
  keys?: ReactNode;
  /** `page` has margins and a measure; `fill` leaves the whole width to the content. */
  layout?: 'page' | 'fill';
  children: ReactNode;
}

export function PageFrame(props: PageFrameProps) {
  const {
    title,
    crumbs = [],
    nav = [],
    navLabel = 'Sections',
    status,
    keys,
    layout = 'page',
    children,
  } = props;
  return (
    <div className="flex min-h-dvh flex-col bg-paper">
      <title>{`${title} · Layerwell`}</title>
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-50 focus:rounded focus:bg-ink focus:px-3 focus:py-2 focus:text-paper"
      >
        Skip to the content
      </a>
      <FrameHeader crumbs={crumbs} nav={nav} navLabel={navLabel} status={status} />
      <main
        id="main"
        tabIndex={-1}
        className={
          layout === 'page'
            ? 'mx-auto w-full max-w-[100rem] flex-1 px-4 py-6 outline-none sm:px-7'
            : 'flex w-full min-w-0 flex-1 flex-col outline-none'
        }
      >
        {children}
      </main>
      <footer className="flex flex-wrap items-center gap-x-7 gap-y-2 border-t border-rule px-4 py-2 text-sm text-muted sm:px-7">
        {keys}
        <p className="sm:ml-auto">
          A resistivity model is not proof of water. Drilling decisions belong to licensed practice and local
          rules.
        </p>
      </footer>
    </div>
  );
}
