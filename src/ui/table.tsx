import { ArrowDown, ArrowUp } from 'lucide-react';
import type { ComponentPropsWithRef, ReactNode } from 'react';
import { classNames } from './class-names';
import { useScrollFrame } from './use-scroll-frame';

export interface TableProps extends ComponentPropsWithRef<'table'> {
  /** Names the table; shown above it unless hidden. */
  caption: string;
  captionHidden?: boolean;
  /** Limits the height, so that the head stays while the rows scroll, as "max-h-96". */
  frameClassName?: string;
}

/** A dense table whose head stays in view; scrolls in its own frame, never the page. */
export function Table({ caption, captionHidden = true, frameClassName, className, ...rest }: TableProps) {
  const frame = useScrollFrame<HTMLElement>();
  return (
    <section
      ref={frame}
      aria-label={caption}
      className={classNames('w-full overflow-auto -outline-offset-2', frameClassName)}
    >
      <table {...rest} className={classNames('w-full border-collapse text-left', className)}>
        <caption className={captionHidden ? 'sr-only' : 'pb-2 text-left font-semibold'}>{caption}</caption>
        {rest.children}
      </table>
    </section>
  );
}

export function TableHead({ children }: { children: ReactNode }) {
  return (
    <thead className="sticky top-0 z-10 bg-paper shadow-[inset_0_-1px_0_var(--edge)]">
      <tr>{children}</tr>
    </thead>
  );
}

export function TableBody(props: ComponentPropsWithRef<'tbody'>) {
  return <tbody {...props} />;
}

export interface TableRowProps extends ComponentPropsWithRef<'tr'> {
  selected?: boolean;
}

export function TableRow({ selected = false, className, ...rest }: TableRowProps) {
  return (
    <tr
      {...rest}
      aria-selected={selected || undefined}
      className={classNames(
        'border-b border-rule hover:bg-sunken',
        selected && 'bg-water-tint hover:bg-water-tint',
        className,
      )}
    />
  );
}

export type SortDirection = 'ascending' | 'descending';

export interface HeaderCellProps extends ComponentPropsWithRef<'th'> {
  /** Numbers stand at the right, under their head. */
  numeric?: boolean;
  unit?: string;
  /** Present when the table is sorted by this column. */
  sorted?: SortDirection | null;
  onSort?: () => void;
}

export function HeaderCell({ numeric, unit, sorted, onSort, className, children, ...rest }: HeaderCellProps) {
  const words = (
    <>
      {children}
      {unit ? <span className="font-normal text-muted"> {unit}</span> : null}
    </>
  );
  const Arrow = sorted === 'descending' ? ArrowDown : ArrowUp;
  return (
    <th
      scope="col"
      {...rest}
      aria-sort={sorted ?? undefined}
      className={classNames('px-2.5 py-1.5 text-sm whitespace-nowrap', numeric && 'text-right', className)}
    >
      {onSort ? (
        <button
          type="button"
          onClick={onSort}
          className={classNames(
            'inline-flex min-h-6 items-center gap-1 rounded font-semibold hover:text-copper touch:min-h-11',
            // the words stay over the figures, whose right edge is theirs
            numeric && 'flex-row-reverse',
          )}
        >
          <span>{words}</span>
          <Arrow aria-hidden size={14} className={sorted ? 'text-copper' : 'opacity-0'} />
        </button>
      ) : (
        words
      )}
    </th>
  );
}

export interface CellProps extends ComponentPropsWithRef<'td'> {
  numeric?: boolean;
}

export function Cell({ numeric = false, className, ...rest }: CellProps) {
  return (
    <td
      {...rest}
      className={classNames(
        'px-2.5 py-1 align-middle',
        numeric && 'figure text-right whitespace-nowrap',
        className,
      )}
    />
  );
}
