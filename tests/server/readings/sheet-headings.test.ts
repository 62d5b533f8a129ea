import { describe, expect, it } from 'vitest';
import type { SheetColumn } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';
import { readHeading } from '../../../server/readings/sheet-headings';

type Row = readonly [heading: string, column: SheetColumn | null, unit: string | null, spread?: SpreadType];

const ROWS: Row[] = [
  ['AB/2 (m)', 'halfAB', 'm'],
  ['AB/2 [ft]', 'halfAB', 'ft'],
  ['ab2_m', 'halfAB', 'm'],
  ['½ AB, m', 'halfAB', 'm'],
  ['L (metres)', 'halfAB', 'm'],
  ['AO (m)', 'halfAB', 'm', 'half-schlumberger'],
  ['MN/2', 'halfMN', null],
  ['MN/2 m', 'halfMN', 'm'],
  ['a (m)', 'spacing', 'm', 'wenner'],
  ['Electrode spacing (feet)', 'spacing', 'ft', 'wenner'],
  ['a', 'dipole', null, 'dipole-dipole'],
  ['n', 'n', null, 'dipole-dipole'],
  ['AM (m)', 'am', 'm', 'electrodes'],
  ['V (mV)', 'voltage', 'mV'],
  ['ΔV [V]', 'voltage', 'V'],
  ['V_mV', 'voltage', 'mV'],
  ['Voltage in mV', 'voltage', 'mV'],
  ['I (mA)', 'current', 'mA'],
  ['Current [A]', 'current', 'A'],
  ['R (Ω)', 'resistance', 'ohm'],
  ['R (\u2126)', 'resistance', 'ohm'],
  ['V/I (ohms)', 'resistance', 'ohm'],
  ['rhoa (ohm m)', 'apparentResistivity', 'ohm-m'],
  ['ρa [Ω·m]', 'apparentResistivity', 'ohm-m'],
  ['rho_a ohm-cm', 'apparentResistivity', 'ohm-cm'],
  ['rhoa_ohm_m', 'apparentResistivity', 'ohm-m'],
  ['App. Res. (Ohm.m)', 'apparentResistivity', 'ohm-m'],
  ['Apparent resistivity (Ω*ft)', 'apparentResistivity', 'ohm-ft'],
  ['error %', 'standardError', 'percent'],
  ['Error(%)', 'standardError', 'percent'],
  ['std. dev. (relative)', 'standardError', 'relative'],
  ['Remarks', 'remark', null],
  ['Remark (weather)', 'remark', null],
  ['AB (m)', null, null],
  ['MN (m)', null, null],
  ['K (m)', null, null],
  ['SP (mV)', null, null],
  ['a (m)', null, null, 'schlumberger'],
  ['Vehicle', null, null],
  ['', null, null],
];
const HEADINGS = ROWS.map(([text, column, unit, spread = 'schlumberger']) => ({
  text,
  column,
  unit,
  spread,
}));

describe('readHeading', () => {
  it.each(HEADINGS)('reads $text as $column in $unit', ({ text, column, unit, spread }) => {
    const heading = readHeading(text, spread);
    expect(heading?.column ?? null).toBe(column);
    expect(heading?.unit.kind === 'named' ? heading.unit.unit : null).toBe(unit);
  });

  it.each([
    ['V (µV)', 'µV'],
    ['AB/2 (cm)', 'cm'],
    ['R (kΩ)', 'kohm'],
    ['I (V)', 'v'],
  ])('tells the unit of %j that cannot be used', (text, written) => {
    const unit = readHeading(text, 'schlumberger')?.unit;
    expect(unit?.kind).toBe('unusable');
    expect(unit?.kind === 'unusable' ? unit.written.toLowerCase() : '').toBe(
      written.normalize('NFKC').toLowerCase(),
    );
  });
});
