import { Download } from 'lucide-react';
import { useId, useRef, useState, type ReactNode } from 'react';
import { classNames } from '../ui/class-names';
import { IconButton } from '../ui/icon-button';
import { Menu, MenuItem } from '../ui/menu';
import { Segmented } from '../ui/segmented';
import { showToast } from '../ui/show-toast';
import { useChartPalette } from './chart-palette';
import { ChartTableView } from './chart-table-view';
import { fileNameOf, tableToCsv, type ChartTable } from './chart-table';
import { drawingToPng, drawingToSvg } from './save-drawing';
import { saveFile } from './save-file';

export interface ChartFrameProps {
  title: string;
  /** Quantity and unit, as "Ω·m, Schlumberger, 20 readings". */
  note?: ReactNode;
  table: ChartTable;
  /** More choices of the drawing, as its scale. */
  actions?: ReactNode;
  /** Added to the title in file names, as the sounding's name. */
  subject?: string;
  headingLevel?: 2 | 3;
  className?: string;
  children: ReactNode;
}

type View = 'drawing' | 'table';
const VIEWS: readonly { value: View; label: string }[] = [
  { value: 'drawing', label: 'Drawing' },
  { value: 'table', label: 'Table' },
];

/** Title, unit, the same data as a table, and saving: what every drawing of the product stands in. */
export function ChartFrame(props: ChartFrameProps) {
  const { title, note, table, actions, subject, headingLevel = 2, className, children } = props;
  const [view, setView] = useState<View>('drawing');
  const titleId = useId();
  const body = useRef<HTMLDivElement>(null);
  const Heading = `h${headingLevel}` as const;
  return (
    <figure
      aria-labelledby={titleId}
      className={classNames('flex min-h-0 min-w-0 flex-col gap-2', className)}
    >
      <figcaption className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
        <div className="flex min-w-0 flex-wrap items-baseline gap-x-4">
          <Heading id={titleId} className="text-base font-semibold">
            {title}
          </Heading>
          {note ? <span className="text-sm text-muted">{note}</span> : null}
        </div>
        <div className="flex items-center gap-1.5 print:hidden">
          {view === 'drawing' ? actions : null}
          <Segmented label={`${title}: show as`} value={view} options={VIEWS} onChange={setView} />
          <SaveMenu
            title={subject ? `${title}, ${subject}` : title}
            table={table}
            findDrawing={() => body.current?.querySelector('svg') ?? null}
          />
        </div>
      </figcaption>
      {view === 'table' ? <ChartTableView caption={title} table={table} /> : null}
      {/* The drawing stays in place, hidden, so that it can be saved from the table as well. */}
      <div
        ref={body}
        aria-hidden={view === 'table' || undefined}
        inert={view === 'table'}
        className={classNames(
          'relative flex min-h-0 min-w-0 flex-1 flex-col',
          view === 'table' && 'invisible absolute h-96 w-full',
        )}
      >
        {children}
      </div>
    </figure>
  );
}

interface SaveMenuProps {
  title: string;
  table: ChartTable;
  findDrawing: () => SVGSVGElement | null;
}

function SaveMenu({ title, table, findDrawing }: SaveMenuProps) {
  const { paper, ink } = useChartPalette();
  const name = fileNameOf(title);
  const save = async (kind: 'png' | 'svg') => {
    const svg = findDrawing();
    if (!svg) throw new Error('There is no drawing yet.');
    const drawing = { svg, title, background: paper, ink };
    const content =
      kind === 'png'
        ? await drawingToPng(drawing)
        : new Blob([await drawingToSvg(drawing)], { type: 'image/svg+xml' });
    saveFile(`${name}.${kind}`, content);
  };
  const trySave = (kind: 'png' | 'svg') => {
    save(kind).catch((fault: unknown) => {
      showToast({
        kind: 'bad',
        title: 'The drawing was not saved',
        description: fault instanceof Error ? fault.message : String(fault),
      });
    });
  };
  const saveCsv = () =>
    saveFile(`${name}.csv`, new Blob(['\ufeff', tableToCsv(table)], { type: 'text/csv;charset=utf-8' }));
  return (
    <Menu trigger={<IconButton label={`Save ${title}`} icon={<Download aria-hidden size={16} />} />}>
      <MenuItem onSelect={() => trySave('png')}>Picture (PNG)</MenuItem>
      <MenuItem onSelect={() => trySave('svg')}>Drawing (SVG)</MenuItem>
      <MenuItem onSelect={saveCsv}>Numbers (CSV)</MenuItem>
    </Menu>
  );
}
