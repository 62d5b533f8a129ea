import type { ImportMapping } from '../../../server/contract/readings';
import { Checkbox } from '../../ui/checkbox';
import { Field } from '../../ui/field';
import { Select } from '../../ui/select';

const DELIMITERS = [
  { value: ',', label: 'Comma ,' },
  { value: ';', label: 'Semicolon ;' },
  { value: '\t', label: 'Tab' },
  { value: '|', label: 'Bar |' },
];
const DECIMAL_MARKS = [
  { value: '.', label: 'Point 1.5' },
  { value: ',', label: 'Comma 1,5' },
];

interface ImportFormatProps {
  mapping: ImportMapping;
  onChange: (mapping: ImportMapping) => void;
}

/** How the text of the file is cut into cells and numbers. */
export function ImportFormat({ mapping, onChange }: ImportFormatProps) {
  return (
    <fieldset className="grid grid-cols-2 items-end gap-3 sm:grid-cols-3">
      <legend className="mb-2 font-semibold">How the file is written</legend>
      <Field label="Between cells">
        <Select
          options={DELIMITERS}
          value={mapping.delimiter}
          onChange={(event) =>
            onChange({ ...mapping, delimiter: event.target.value as ImportMapping['delimiter'] })
          }
        />
      </Field>
      <Field label="Decimal mark">
        <Select
          options={DECIMAL_MARKS}
          value={mapping.decimalMark}
          onChange={(event) =>
            onChange({ ...mapping, decimalMark: event.target.value as ImportMapping['decimalMark'] })
          }
        />
      </Field>
      <Checkbox
        className="pb-1"
        label="The first line is headings"
        checked={mapping.hasHeader}
        onChange={(event) => onChange({ ...mapping, hasHeader: event.target.checked })}
      />
    </fieldset>
  );
}
