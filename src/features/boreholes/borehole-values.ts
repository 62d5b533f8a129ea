import type { z } from 'zod';
import type { Borehole, writeBoreholeSchema } from '../../../server/contract/surveys';
import { plainText } from '../../ui/version-fields';

export type BoreholeValues = z.output<typeof writeBoreholeSchema>;

export const BOREHOLE_LABELS: Record<keyof BoreholeValues, string> = {
  name: 'Name',
  xM: 'x',
  yM: 'y',
  elevationM: 'Elevation',
  depthM: 'Depth of the hole',
  drilledOn: 'Drilled on',
  note: 'Note',
  intervals: 'Log',
  waterLevels: 'Water levels',
};

export const EMPTY_BOREHOLE: Omit<BoreholeValues, 'depthM'> & { depthM: number | null } = {
  name: '',
  xM: null,
  yM: null,
  elevationM: null,
  depthM: null,
  drilledOn: null,
  note: '',
  intervals: [],
  waterLevels: [],
};

/** What of a borehole the form edits. */
export const boreholeValues = ({
  id: _id,
  surveyId: _surveyId,
  version: _version,
  ...values
}: Borehole): BoreholeValues => values;

/** A field as people read it when two versions stand beside each other. */
export function showBoreholeField(key: keyof BoreholeValues, value: unknown): string {
  if (key === 'intervals')
    return (value as BoreholeValues['intervals'])
      .map(({ topM, baseM, description }) => `${topM}–${baseM} m ${description}`)
      .join('\n');
  if (key === 'waterLevels')
    return (value as BoreholeValues['waterLevels'])
      .map(({ measuredOn, depthM }) => `${measuredOn}: ${depthM} m`)
      .join('\n');
  return plainText(value);
}
