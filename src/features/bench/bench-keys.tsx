import { Kbd } from '../../ui/kbd';

/** Keys of the Bench, in the footer; they count while the focus is in the drawing. */
export function BenchKeys({ mayFit }: { mayFit: boolean }) {
  return (
    <p className="flex flex-wrap items-center gap-x-6 gap-y-1.5 print:hidden">
      <span className="whitespace-nowrap">
        <Kbd>drag</Kbd> a boundary, or <Kbd>↑</Kbd> <Kbd>↓</Kbd> on it
      </span>
      <span className="whitespace-nowrap">
        <Kbd>←</Kbd> <Kbd>→</Kbd> on a bed: its ρ
      </span>
      <span className="whitespace-nowrap">
        in the drawing: {mayFit ? <Kbd>F</Kbd> : null}
        {mayFit ? ' fit, ' : null}
        <Kbd>Z</Kbd> undo
      </span>
    </p>
  );
}
