import { Toggle } from '@base-ui/react/toggle';
import { ToggleGroup } from '@base-ui/react/toggle-group';

export interface SegmentedProps<Value extends string> {
  label: string;
  value: Value;
  options: readonly { value: Value; label: string }[];
  onChange: (value: Value) => void;
}

/** Two to four ways of seeing the same thing, one chosen. */
export function Segmented<Value extends string>({ label, value, options, onChange }: SegmentedProps<Value>) {
  const choose = (chosen: readonly string[]) => {
    const option = options.find((candidate) => candidate.value === chosen[0]);
    if (option) onChange(option.value);
  };
  return (
    <ToggleGroup
      aria-label={label}
      value={[value]}
      onValueChange={choose}
      className="inline-flex shrink-0 rounded border border-edge bg-sheet"
    >
      {options.map((option) => (
        <Toggle
          key={option.value}
          value={option.value}
          className="min-h-6 border-r border-rule px-2 text-sm text-muted last:border-r-0 hover:text-ink data-pressed:bg-water-tint data-pressed:font-semibold data-pressed:text-ink touch:min-h-11 touch:px-3"
        >
          {option.label}
        </Toggle>
      ))}
    </ToggleGroup>
  );
}
