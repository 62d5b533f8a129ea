import type { SheetUnits } from '../../../server/contract/readings';
import { Field } from '../../ui/field';
import { Select, type SelectOption } from '../../ui/select';

type UnitName = keyof SheetUnits;

const QUANTITIES: readonly { key: UnitName; label: string; options: readonly SelectOption[] }[] = [
  {
    key: 'length',
    label: 'Lengths',
    options: [
      { value: 'm', label: 'm' },
      { value: 'ft', label: 'ft' },
    ],
  },
  {
    key: 'voltage',
    label: 'V',
    options: [
      { value: 'mV', label: 'mV' },
      { value: 'V', label: 'V' },
    ],
  },
  {
    key: 'current',
    label: 'I',
    options: [
      { value: 'mA', label: 'mA' },
      { value: 'A', label: 'A' },
    ],
  },
  {
    key: 'resistivity',
    label: 'ρa on sheet',
    options: [
      { value: 'ohm-m', label: 'Ω·m' },
      { value: 'ohm-cm', label: 'Ω·cm' },
      { value: 'ohm-ft', label: 'Ω·ft' },
    ],
  },
  {
    key: 'standardError',
    label: 'Error',
    options: [
      { value: 'percent', label: '%' },
      { value: 'relative', label: 'relative' },
    ],
  },
];

interface UnitsChooserProps {
  units: SheetUnits;
  onChange: (units: SheetUnits) => void;
}

/** The units in which the numbers are written. Changing one never rewrites a number. */
export function UnitsChooser({ units, onChange }: UnitsChooserProps) {
  return (
    <div className="grid grid-cols-2 gap-3 sm:grid-cols-5">
      {QUANTITIES.map(({ key, label, options }) => (
        <Field key={key} label={label}>
          <Select
            options={options}
            value={units[key]}
            onChange={(event) => onChange({ ...units, [key]: event.target.value } as SheetUnits)}
          />
        </Field>
      ))}
    </div>
  );
}

/** "m, mV, mA, Ω·m, %". */
export const unitsInWords = (units: SheetUnits): string =>
  QUANTITIES.map(({ key, options }) => options.find(({ value }) => value === units[key])?.label).join(', ');
