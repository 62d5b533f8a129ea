import { rampColor } from '../charts/resistivity-ramp';

/** The colour of a resistivity, always beside its number. */
export function BedSwatch({ resistivity }: { resistivity: number }) {
  return (
    <span
      aria-hidden
      className="inline-block size-3 rounded-sm border border-rule align-[-0.1em]"
      style={{ backgroundColor: rampColor(resistivity) }}
    />
  );
}
