import { z } from 'zod';
import { createSoundingSchema, type Sounding } from '../../server/contract/soundings';

const { shape } = createSoundingSchema;

/** The contract's object with every field present, as a form holds them. */
export const soundingFormSchema = z.strictObject({
  name: shape.name,
  lineId: shape.lineId.unwrap(),
  spreadType: shape.spreadType,
  measuredOn: shape.measuredOn.unwrap(),
  xM: shape.xM.unwrap(),
  yM: shape.yM.unwrap(),
  elevationM: shape.elevationM.unwrap(),
  elevationDatum: shape.elevationDatum.unwrap(),
  azimuthDeg: shape.azimuthDeg.unwrap(),
  crew: shape.crew.unwrap(),
  instrument: shape.instrument.unwrap(),
  note: shape.note.unwrap(),
});
export type SoundingFormValues = z.output<typeof soundingFormSchema>;

export const SOUNDING_LABELS: Record<keyof SoundingFormValues, string> = {
  name: 'Name',
  lineId: 'Line',
  spreadType: 'Spread',
  measuredOn: 'Measured on',
  xM: 'x',
  yM: 'y',
  elevationM: 'Elevation',
  elevationDatum: 'Height datum',
  azimuthDeg: 'Azimuth of the spread',
  crew: 'Crew',
  instrument: 'Instrument',
  note: 'Note',
};

export const EMPTY_SOUNDING: SoundingFormValues = {
  name: '',
  lineId: null,
  spreadType: 'schlumberger',
  measuredOn: null,
  xM: null,
  yM: null,
  elevationM: null,
  elevationDatum: '',
  azimuthDeg: null,
  crew: '',
  instrument: '',
  note: '',
};

/** What of a sounding the form edits. */
export function soundingValues(sounding: Sounding): SoundingFormValues {
  const keys = Object.keys(EMPTY_SOUNDING) as (keyof SoundingFormValues)[];
  return Object.fromEntries(keys.map((key) => [key, sounding[key]])) as SoundingFormValues;
}
