import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { lineListQuery } from '../../api/survey-queries';
import { SOUNDING_STATE_LOOK, SOUNDING_STATES } from '../../soundings/sounding-state-look';
import { SPREAD_OPTIONS } from '../../soundings/spread-words';
import { Field } from '../../ui/field';
import { Input } from '../../ui/input';
import { Select } from '../../ui/select';
import { readListParams, type SoundingListParams } from './sounding-list-params';

interface SoundingFiltersProps {
  surveyId: string;
  params: SoundingListParams;
  onChange: (params: SoundingListParams) => void;
}

const STATE_OPTIONS = SOUNDING_STATES.map((value) => ({ value, label: SOUNDING_STATE_LOOK[value].label }));
const SEARCH_DELAY_MS = 250;

export function SoundingFilters({ surveyId, params, onChange }: SoundingFiltersProps) {
  const lines = useQuery(lineListQuery(surveyId));
  const lineOptions = (lines.data?.items ?? []).map(({ id, name }) => ({ value: id, label: name }));
  const choose = (key: string, text: string) => {
    const search = new URLSearchParams({ [key]: text });
    const { lineId, state, spreadType } = readListParams(search);
    const change = { line: { lineId }, state: { state }, spread: { spreadType } }[key];
    onChange({ ...params, ...change, page: 1 } as SoundingListParams);
  };
  return (
    <search className="mb-4 grid grid-cols-2 gap-3 md:grid-cols-[minmax(0,2fr)_repeat(3,minmax(0,1fr))]">
      <SearchField params={params} onChange={onChange} />
      <Field label="Line">
        <Select
          options={lineOptions}
          placeholder="All lines"
          value={params.lineId ?? ''}
          onChange={(event) => choose('line', event.target.value)}
        />
      </Field>
      <Field label="State">
        <Select
          options={STATE_OPTIONS}
          placeholder="All states"
          value={params.state ?? ''}
          onChange={(event) => choose('state', event.target.value)}
        />
      </Field>
      <Field label="Spread" className="hidden md:flex">
        <Select
          options={SPREAD_OPTIONS}
          placeholder="All spreads"
          value={params.spreadType ?? ''}
          onChange={(event) => choose('spread', event.target.value)}
        />
      </Field>
    </search>
  );
}

/** Searches as one types, after a short rest; keeps its own text while the address follows. */
function SearchField({ params, onChange }: Omit<SoundingFiltersProps, 'surveyId'>) {
  const [text, setText] = useState(params.search);
  const [known, setKnown] = useState(params.search);
  if (known !== params.search) {
    setKnown(params.search);
    setText(params.search);
  }
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const type = (next: string) => {
    setText(next);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => {
      const search = next.trim();
      setKnown(search);
      onChange({ ...params, search, page: 1 });
    }, SEARCH_DELAY_MS);
  };
  return (
    <Field label="Search" className="col-span-2 md:col-span-1">
      <Input
        type="search"
        placeholder="Name or line"
        value={text}
        maxLength={120}
        onChange={(event) => type(event.target.value)}
      />
    </Field>
  );
}
