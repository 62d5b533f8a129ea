import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { messageOf } from '../api/api-error';
import { lineListQuery } from '../api/survey-queries';
import { Button } from '../ui/button';
import { Field } from '../ui/field';
import { Input } from '../ui/input';
import { Select } from '../ui/select';
import { useCreateLine } from './sounding-mutations';

interface LinePickerProps {
  surveyId: string;
  value: string | null;
  onChange: (lineId: string | null) => void;
}

/** The line a sounding stands on: one of the survey's, none, or a new one. */
export function LinePicker({ surveyId, value, onChange }: LinePickerProps) {
  const lines = useQuery(lineListQuery(surveyId));
  const create = useCreateLine(surveyId);
  const [newName, setNewName] = useState<string | null>(null);
  const options = (lines.data?.items ?? []).map((line) => ({ value: line.id, label: line.name }));
  const add = () =>
    create.mutate(
      { name: (newName ?? '').trim() },
      {
        onSuccess: (line) => {
          onChange(line.id);
          setNewName(null);
        },
      },
    );
  if (newName !== null)
    return (
      <Field label="Name of the new line" error={create.error ? messageOf(create.error) : undefined}>
        <div className="flex gap-2">
          <Input
            aria-label="Name of the new line"
            value={newName}
            onChange={(event) => setNewName(event.target.value)}
            onKeyDown={(event) => {
              if (event.key !== 'Enter') return;
              event.preventDefault();
              add();
            }}
          />
          <Button loading={create.isPending} disabled={newName.trim() === ''} onClick={add}>
            Add
          </Button>
          <Button kind="quiet" onClick={() => setNewName(null)}>
            Cancel
          </Button>
        </div>
      </Field>
    );
  return (
    <Field label="Line" error={lines.error ? messageOf(lines.error) : undefined}>
      <div className="flex gap-2">
        <Select
          aria-label="Line"
          options={options}
          placeholder="No line"
          value={value ?? ''}
          onChange={(event) => onChange(event.target.value === '' ? null : event.target.value)}
        />
        <Button className="shrink-0" onClick={() => setNewName('')}>
          New line
        </Button>
      </div>
    </Field>
  );
}
