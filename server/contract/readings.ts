import { z } from 'zod';
import { idSchema, listOf, personSchema, timestampSchema } from './common';
import { spreadSchema, spreadTypeSchema } from './spread';

/** One reading as frozen in a revision. Exactly what was on the sheet, in SI and trade units; derived values are never stored. */
export const readingSchema = z
  .strictObject({
    spread: spreadSchema,
    voltageMv: z.number().min(-1e7).max(1e7).nullable(),
    currentMa: z.number().min(-1e6).max(1e6).nullable(),
    resistanceOhm: z.number().min(-1e9).max(1e9).nullable(),
    sheetApparentResistivityOhmM: z.number().gt(0).max(1e9).nullable().describe('ρa as written on the sheet'),
    standardError: z
      .number()
      .min(0)
      .max(1)
      .nullable()
      .describe(
        'the reading’s own relative error, 0 as some instruments print it; the survey’s floor is added later',
      ),
    remark: z.string().max(500),
    excluded: z
      .string()
      .min(1)
      .max(500)
      .nullable()
      .describe('reason for leaving the reading out; null = kept'),
  })
  .meta({ id: 'Reading' });
export type Reading = z.infer<typeof readingSchema>;

/** Columns that a Field sheet of any spread has, in the order in which a crew writes them. */
export const VALUE_COLUMNS = [
  'voltage',
  'current',
  'resistance',
  'apparentResistivity',
  'standardError',
  'remark',
] as const;

/** Columns a Field sheet may have; which of the lengths apply follows from the spread type. */
export const sheetColumnSchema = z.enum([
  'halfAB',
  'halfMN',
  'spacing',
  'dipole',
  'n',
  'am',
  'an',
  'bm',
  'bn',
  ...VALUE_COLUMNS,
]);
export type SheetColumn = z.infer<typeof sheetColumnSchema>;

export const SPACING_COLUMNS = {
  schlumberger: ['halfAB', 'halfMN'],
  'half-schlumberger': ['halfAB', 'halfMN'],
  wenner: ['spacing'],
  'pole-pole': ['spacing'],
  'dipole-dipole': ['dipole', 'n'],
  electrodes: ['am', 'an', 'bm', 'bn'],
} as const satisfies Record<z.infer<typeof spreadTypeSchema>, readonly SheetColumn[]>;

export const sheetUnitsSchema = z
  .strictObject({
    length: z.enum(['m', 'ft']),
    voltage: z.enum(['mV', 'V']),
    current: z.enum(['mA', 'A']),
    resistivity: z.enum(['ohm-m', 'ohm-cm', 'ohm-ft']),
    standardError: z.enum(['percent', 'relative']),
  })
  .meta({ id: 'SheetUnits' });
export type SheetUnits = z.infer<typeof sheetUnitsSchema>;
export const DEFAULT_SHEET_UNITS: SheetUnits = {
  length: 'm',
  voltage: 'mV',
  current: 'mA',
  resistivity: 'ohm-m',
  standardError: 'percent',
};

/** One row as typed: text in each cell, so that half-written numbers survive. Absent cell = empty. */
export const sheetRowSchema = z
  .strictObject({
    cells: z.partialRecord(sheetColumnSchema, z.string().max(500)),
    excluded: z.string().max(500).nullable(),
  })
  .meta({ id: 'SheetRow' });
export type SheetRow = z.infer<typeof sheetRowSchema>;

/** A fault that stops a row from becoming a reading. */
export const rowFaultSchema = z
  .strictObject({
    row: z.number().int().min(1).describe('counted from 1; in an upload, the line of the file'),
    column: z.string().describe('heading of the column, or the column’s name; empty = the whole row'),
    found: z.string(),
    message: z.string(),
    allowed: z.string(),
  })
  .meta({ id: 'RowFault' });
export type RowFault = z.infer<typeof rowFaultSchema>;

/** A doubt about readings that alters nothing; says its rule and where it comes from. */
export const readingCheckSchema = z
  .strictObject({
    rows: z.array(z.number().int().min(1)),
    kind: z.enum([
      'sheet-mismatch',
      'steep-rise',
      'branch-jump',
      'wide-mn',
      'far-from-trend',
      'repeat-disagrees',
      'mixed-signs',
    ]),
    message: z.string(),
    rule: z.string(),
    source: z.string(),
  })
  .meta({ id: 'ReadingCheck' });
export type ReadingCheck = z.infer<typeof readingCheckSchema>;

/** What follows from a reading: computed, never stored. */
export const derivedReadingSchema = z
  .strictObject({
    plottingSpacingM: z.number().describe('AB/2, or its equal for other spreads'),
    geometricFactorM: z.number().nullable().describe('K; null where MN was not recorded'),
    resistanceOhm: z.number().nullable(),
    apparentResistivityOhmM: z.number(),
    relativeError: z.number().describe('own error and the survey’s floor in quadrature'),
  })
  .meta({ id: 'DerivedReading' });
export type DerivedReading = z.infer<typeof derivedReadingSchema>;

export const revisionSummarySchema = z
  .strictObject({
    id: idSchema,
    soundingId: idSchema,
    number: z.number().int(),
    contentHash: z.string(),
    author: personSchema,
    createdAt: timestampSchema,
    readings: z.number().int(),
    excluded: z.number().int(),
    sourceFile: z.strictObject({ id: idSchema, name: z.string(), sha256: z.string() }).nullable(),
    linesLeftOut: z
      .number()
      .int()
      .describe('lines of the source file whose faults kept them out when it was imported'),
    current: z.boolean(),
  })
  .meta({ id: 'RevisionSummary' });
export const revisionListSchema = listOf(revisionSummarySchema);

export const revisionSchema = revisionSummarySchema
  .omit({ readings: true })
  .extend({
    readings: z.array(readingSchema),
    derived: z.array(derivedReadingSchema).describe('one a reading, in order'),
    checks: z.array(readingCheckSchema),
    importFaults: z.array(rowFaultSchema).describe('why lines of the source file were left out'),
  })
  .meta({ id: 'Revision' });
export type Revision = z.infer<typeof revisionSchema>;

const rowsField = z.array(sheetRowSchema).max(5000);
export const draftSchema = z
  .strictObject({
    rows: rowsField,
    units: sheetUnitsSchema,
    baseRevisionId: idSchema.nullable().describe('the revision the draft started from'),
    updatedAt: timestampSchema,
  })
  .meta({ id: 'ReadingDraft' });
export const writeDraftSchema = draftSchema.omit({ updatedAt: true }).meta({ id: 'WriteReadingDraft' });

/** A Field sheet: the current revision, and the caller's own draft where there is one. */
export const fieldSheetSchema = z
  .strictObject({
    soundingId: idSchema,
    spreadType: spreadTypeSchema,
    revision: revisionSchema.nullable(),
    draft: draftSchema.nullable(),
  })
  .meta({ id: 'FieldSheet' });
export type FieldSheet = z.infer<typeof fieldSheetSchema>;

export const saveRevisionSchema = writeDraftSchema.meta({ id: 'SaveRevision' });

/** How the columns of a file become columns of the sheet; null = not used. */
export const importMappingSchema = z
  .strictObject({
    hasHeader: z.boolean(),
    delimiter: z.enum([',', ';', '\t', '|']),
    decimalMark: z.enum(['.', ',']),
    columns: z.array(sheetColumnSchema.nullable()).max(100),
    units: sheetUnitsSchema,
  })
  .meta({ id: 'ImportMapping' });
export type ImportMapping = z.infer<typeof importMappingSchema>;

/** Answer to an upload that stores nothing: what would be imported, and every fault. */
export const importPreviewSchema = z
  .strictObject({
    fileName: z.string(),
    sha256: z.string(),
    headings: z.array(z.string()),
    mapping: importMappingSchema.describe('as sent, or as found in the file'),
    unitsStated: z.boolean().describe('whether the headings name the units that are used'),
    rows: z.array(sheetRowSchema.extend({ line: z.number().int() })),
    readings: z.array(derivedReadingSchema.extend({ line: z.number().int() })).describe('the good rows'),
    faults: z.array(rowFaultSchema),
    checks: z.array(readingCheckSchema),
    missingColumns: z.array(z.string()).describe('columns the spread needs that nothing is mapped to'),
  })
  .meta({ id: 'ImportPreview' });
export type ImportPreview = z.infer<typeof importPreviewSchema>;

export const importAcceptSchema = z.enum(['all', 'good-rows']);
