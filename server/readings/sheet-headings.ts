import type { SheetColumn, SheetUnits } from '../contract/readings';
import { NUMBER_COLUMNS, sheetColumnsOf } from '../contract/sheet-columns';
import type { SpreadType } from '../contract/spread';

export type UnitKey = keyof SheetUnits;

/** What a heading says of its unit. */
export type HeadingUnit =
  | { readonly kind: 'none' }
  | { readonly kind: 'named'; readonly unit: string }
  | { readonly kind: 'unusable'; readonly written: string };

export interface Heading {
  readonly column: SheetColumn;
  readonly unit: HeadingUnit;
}

/** Names as they are left when all but letters, digits and / is taken out. */
const NAMES: Record<SheetColumn, readonly string[]> = {
  halfAB: [
    'ab/2',
    'ab2',
    'halfab',
    '1/2ab',
    'l',
    's',
    'ao',
    'oa',
    'halfcurrentspacing',
    'currenthalfspacing',
  ],
  halfMN: ['mn/2', 'mn2', 'halfmn', '1/2mn', 'b', 'halfpotentialspacing', 'potentialhalfspacing'],
  spacing: ['a', 'am', 'spacing', 'aspacing', 'electrodespacing', 'pinspacing', 'probespacing', 'separation'],
  dipole: ['a', 'dipole', 'dipolelength', 'dipolesize', 'aspacing', 'spacing'],
  n: ['n', 'nfactor', 'nlevel', 'level', 'nspacing'],
  am: ['am'],
  an: ['an'],
  bm: ['bm'],
  bn: ['bn'],
  voltage: ['v', 'u', 'dv', 'δv', 'deltav', 'vmn', 'voltage', 'potential', 'potentialdifference', 'pd'],
  current: ['i', 'iab', 'current'],
  resistance: ['r', 'v/i', 'dv/i', 'δv/i', 'resistance', 'apparentresistance'],
  apparentResistivity: [
    'rhoa',
    'ρa',
    'rho',
    'ρ',
    'roa',
    'rhoapp',
    'ρapp',
    'apparentresistivity',
    'appresistivity',
    'appres',
    'apparentres',
    'apprho',
    'resistivity',
  ],
  standardError: [
    'error',
    'err',
    'std',
    'stddev',
    'sd',
    'sigma',
    'σ',
    'dev',
    'deviation',
    'standarderror',
    'standarddeviation',
    'stackingerror',
    'relativeerror',
    'uncertainty',
  ],
  remark: ['remark', 'remarks', 'note', 'notes', 'comment', 'comments', 'observation', 'observations'],
};

/** Units by quantity, as they are left when signs between the letters are taken out. */
const UNITS: Record<UnitKey, Record<string, readonly string[]>> = {
  length: { m: ['m', 'meter', 'meters', 'metre', 'metres'], ft: ['ft', 'feet', 'foot'] },
  voltage: { mV: ['mv', 'millivolt', 'millivolts'], V: ['v', 'volt', 'volts'] },
  current: {
    mA: ['ma', 'milliamp', 'milliamps', 'milliampere', 'milliamperes'],
    A: ['a', 'amp', 'amps', 'ampere', 'amperes'],
  },
  resistivity: {
    'ohm-m': ['ohmm', 'ohmmeter', 'ohmmeters', 'ohmmetre', 'ohmmetres'],
    'ohm-cm': ['ohmcm', 'ohmcentimeter', 'ohmcentimeters', 'ohmcentimetre', 'ohmcentimetres'],
    'ohm-ft': ['ohmft', 'ohmfeet', 'ohmfoot'],
  },
  standardError: { percent: ['%', 'percent', 'pct'], relative: ['relative', 'rel', 'fraction'] },
};
const OHM = new Set(['ohm']);
const OTHER_UNITS = new Set([
  'cm',
  'mm',
  'km',
  'in',
  'inch',
  'inches',
  'yd',
  'uv',
  'µv',
  'μv',
  'kv',
  'ua',
  'µa',
  'μa',
  'ka',
  'kohm',
  'mohm',
  'ohmkm',
  'kohmm',
  'ohmin',
  'sm',
  'ms/m',
  's/m',
]);

/** The key of SheetUnits that a column is written in; null for a plain number or text. */
export function unitKeyOf(column: SheetColumn): UnitKey | null {
  if (column === 'remark') return null;
  const { quantity } = NUMBER_COLUMNS[column];
  return quantity === 'resistance' || quantity === 'count' ? null : quantity;
}

const plain = (text: string): string =>
  text.normalize('NFKC').toLowerCase().replaceAll('⁄', '/').replaceAll('ω', 'ohm').replaceAll('ohms', 'ohm');
const nameKey = (text: string): string => text.replace(/[^\p{L}\p{N}/%]/gu, '');
const unitKey = (text: string): string =>
  text.replace(/^[\s_,:]*(in\s+)?/, '').replace(/[^\p{L}\p{N}%/]/gu, '');

function unitIn(text: string, column: SheetColumn): HeadingUnit {
  const written = unitKey(text);
  const key = unitKeyOf(column);
  if (key) {
    const unit = Object.entries(UNITS[key]).find(([, spellings]) => spellings.includes(written))?.[0];
    if (unit !== undefined) return { kind: 'named', unit };
  }
  if (column === 'resistance' && OHM.has(written)) return { kind: 'named', unit: 'ohm' };
  const ofOthers = OTHER_UNITS.has(written) || OHM.has(written) || isAnyUnit(written);
  return ofOthers && column !== 'remark' ? { kind: 'unusable', written: text.trim() } : { kind: 'none' };
}

const isAnyUnit = (written: string): boolean =>
  Object.values(UNITS).some((units) => Object.values(units).some((spellings) => spellings.includes(written)));

/** A heading cut into a name and what may be its unit, the likeliest cut first. */
function cuts(heading: string): (readonly [name: string, unit: string])[] {
  const bracket = /^([^([{]*)[([{]([^)\]}]*)[)\]}]?(.*)$/.exec(heading);
  if (bracket) return [[`${bracket[1] ?? ''}${bracket[3] ?? ''}`, bracket[2] ?? '']];
  const ends = [...heading.matchAll(/[\s_,:%]+/g)].map((match) => match.index);
  return [[heading, ''], ...ends.map((at) => [heading.slice(0, at), heading.slice(at)] as const)];
}

/** The column of a Field sheet that a heading names, with its unit; null when it names none. */
export function readHeading(text: string, spreadType: SpreadType): Heading | null {
  const columns = sheetColumnsOf(spreadType);
  for (const [name, unitText] of cuts(plain(text))) {
    const column = columns.find((candidate) => NAMES[candidate].includes(nameKey(name)));
    if (column === undefined) continue;
    const unit = unitIn(unitText, column);
    // without brackets, a rest that is no unit belongs to another name
    if (unitText !== '' && unit.kind === 'none' && !/[([{]/.test(text)) continue;
    return { column, unit };
  }
  return null;
}

/** The unit that a cell below a heading states and nothing else, as in a second heading line. */
export function readUnitCell(text: string, column: SheetColumn): HeadingUnit {
  return unitIn(plain(text).replace(/[()[\]{}]/g, ''), column);
}
