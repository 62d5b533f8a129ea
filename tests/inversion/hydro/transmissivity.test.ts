import { describe, expect, it } from 'vitest';
import {
  calibrateTransmissivity,
  createRandomStream,
  InversionError,
  transmissivity,
} from '../../../inversion';

const well = (name: string, transmissivityM2PerDay: number, aquifer: number) => ({
  name,
  transmissivityM2PerDay,
  aquifer,
});
const WELLS = [well('P1', 100, 1000), well('P2', 400, 2000), well('P3', 200, 2000)];

describe('calibrateTransmissivity', () => {
  it('takes the geometric mean of the wells and shows their scatter', () => {
    const found = calibrateTransmissivity('resistance', WELLS);
    // ratios 0.1, 0.2, 0.1: geometric mean 0.1 × 2^(1/3), standard deviation of logarithms ln 2/√3
    expect(found.coefficient).toBeCloseTo(0.1 * 2 ** (1 / 3), 12);
    expect(found.scatter).toBeCloseTo(Math.LN2 / Math.sqrt(3), 12);
    expect(found.scatterFactor).toBeCloseTo(2 ** (1 / Math.sqrt(3)), 12);
    expect(found.wells[1]!.ratioToLaw).toBeCloseTo(2 ** (2 / 3), 12);
    expect(found.calibrated).toEqual([1000, 2000]);
    expect(found.formula).toBe('Tr = (Kσ)·T, T = hρ');
    expect(found.cautions).toEqual([expect.stringContaining('Huntley 1986')]);
    expect(calibrateTransmissivity('conductance', WELLS).formula).toContain('S = h/ρ');
  });

  it('refuses fewer than three wells, and wells without a value', () => {
    const two = () => calibrateTransmissivity('resistance', WELLS.slice(1));
    expect(two).toThrow(
      'the survey has 2 pumped wells with an aquifer value; a calibration needs at least 3',
    );
    expect(two).toThrow(InversionError);
    expect(two).toThrow(expect.objectContaining({ code: 'calibration', path: ['wells'] }));
    expect(() => calibrateTransmissivity('resistance', [...WELLS, well('P4', 0, 5)])).toThrow(
      'transmissivityM2PerDay is 0',
    );
  });

  it('says where the wells deny the law of proportion or cannot test it', () => {
    const falling = [well('A', 400, 500), well('B', 200, 1000), well('C', 101, 2000), well('D', 50, 4000)];
    expect(calibrateTransmissivity('resistance', falling).cautions[1]).toContain('their slope is -1.00');
    const alike = [well('A', 100, 500), well('B', 200, 500), well('C', 150, 500)];
    expect(calibrateTransmissivity('resistance', alike).cautions[1]).toContain('cannot test the law');
  });
});

describe('transmissivity', () => {
  const calibration = calibrateTransmissivity('resistance', WELLS);

  it('predicts one new place by Student’s t', () => {
    const { value, prediction, cautions } = transmissivity(calibration, 1500);
    expect(value).toBeCloseTo(150 * 2 ** (1 / 3), 10);
    // t(0.95; 2) = 2.919986 (tables)
    const reach = 2.919986 * calibration.scatter * Math.sqrt(4 / 3);
    expect(Math.log(prediction.p95 / value)).toBeCloseTo(reach, 5);
    expect(Math.log(prediction.p5 / value)).toBeCloseTo(-reach, 5);
    expect(prediction.p50).toBeCloseTo(value, 6);
    expect(cautions).toHaveLength(1);
  });

  it('holds the stated share of new places', () => {
    const random = createRandomStream(5);
    const place = () => {
      const aquifer = Math.exp(random.normal());
      return well('', aquifer * Math.exp(0.4 * random.normal()), aquifer);
    };
    let inside = 0;
    for (let i = 0; i < 600; i++) {
      const law = calibrateTransmissivity('resistance', Array.from({ length: 4 }, place));
      const next = place();
      const { prediction } = transmissivity(law, next.aquifer);
      if (next.transmissivityM2PerDay > prediction.p5 && next.transmissivityM2PerDay < prediction.p95)
        inside++;
    }
    // 90 % ± 3.7 % (three standard errors)
    expect(inside / 600).toBeGreaterThan(0.863);
    expect(inside / 600).toBeLessThan(0.937);
  });

  it('widens with the doubt about the aquifer value', () => {
    const sure = transmissivity(calibration, 1500);
    const unsure = transmissivity(calibration, 1500, [300, 700, 1500, 3200, 7000]);
    expect(unsure.prediction.p95).toBeGreaterThan(1.2 * sure.prediction.p95);
    expect(unsure.prediction.p5).toBeLessThan(sure.prediction.p5 / 1.2);
    expect(unsure.value).toBe(sure.value);
  });

  it('needs no scatter: wells that agree give the range of the ensemble alone', () => {
    const exact = calibrateTransmissivity('resistance', [well('A', 1, 1), well('B', 2, 2), well('C', 4, 4)]);
    expect(transmissivity(exact, 8).prediction.p95).toBeCloseTo(8, 10);
    expect(transmissivity(exact, 8, [4, 8, 16]).prediction.p95).toBeCloseTo(16, 10);
  });

  it('says when it goes beyond the wells', () => {
    expect(transmissivity(calibration, 5000).cautions[1]).toContain('outside of what the wells calibrate');
    expect(() => transmissivity(calibration, 0)).toThrow('aquifer is 0');
  });
});
