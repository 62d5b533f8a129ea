import { Kbd } from '../../ui/kbd';

/** Keys of the Bench, in the footer; they count while the focus is in the drawing. */
export function BenchKeys() {
  return (
    <p className="hidden flex-wrap items-center gap-x-6 gap-y-1 md:flex">
      <span>
        <Kbd>drag</Kbd> a boundary, or <Kbd>↑</Kbd> <Kbd>↓</Kbd> on it
      </span>
      <span>
        <Kbd>←</Kbd> <Kbd>→</Kbd> on a bed: its ρ
      </span>
      <span>
        in the drawing: <Kbd>F</Kbd> fit, <Kbd>Z</Kbd> undo
      </span>
    </p>
  );
}
