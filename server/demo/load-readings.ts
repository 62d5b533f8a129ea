import { formatSheetRow } from '../contract/field-sheet';
import { DEFAULT_SHEET_UNITS, type Reading } from '../contract/readings';
import { importFile, previewImport } from '../readings/import-service';
import { saveSheet } from '../readings/reading-service';
import { crewSheet } from './crew-sheet';
import type { As } from './load-demo';
import type { DemoSounding } from './scenario';

/** The crew's sheet goes in as an upload, as a person would send it; then the geophysicist leaves out what has a reason. */
export async function loadReadings(as: As, soundingId: string, sounding: DemoSounding): Promise<void> {
  const work = as('geophysicist');
  const file = { originalname: `${sounding.name}.csv`, buffer: Buffer.from(crewSheet(sounding)) };
  const { mapping } = await previewImport(work, soundingId, file, undefined);
  const { body: revision } = await importFile(work, soundingId, file, { mapping, accept: 'all' });
  const { trouble } = sounding;
  if (trouble?.kind !== 'outlier' || trouble.excluded === null) return;
  const readings = revision.readings.map((reading) =>
    spacingOf(reading) === trouble.spacing ? { ...reading, excluded: trouble.excluded } : reading,
  );
  await saveSheet(work, soundingId, {
    rows: readings.map((reading) => formatSheetRow(reading, DEFAULT_SHEET_UNITS)),
    units: DEFAULT_SHEET_UNITS,
    baseRevisionId: revision.id,
  });
}

const spacingOf = ({ spread }: Reading): number | null =>
  spread.type === 'schlumberger' ? spread.halfAB : spread.type === 'wenner' ? spread.spacing : null;
