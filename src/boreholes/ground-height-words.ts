import { formatGiven, withUnit } from '../ui/format';

/** To the centimetre, without zeros that say nothing. */
const centimetres = (value: number): string => withUnit(formatGiven(Number(value.toFixed(2))), 'm');

/** How high a hole stands beside a sounding: "ground 393.8 m, 2.6 m lower than here"; null where nobody levelled the hole. */
export function groundHeightWords(holeM: number | null, hereM: number | null): string | null {
  if (holeM === null) return null;
  const ground = `ground ${centimetres(holeM)}`;
  if (hereM === null) return ground;
  const above = Number((holeM - hereM).toFixed(2));
  if (above === 0) return `${ground}, as high as here`;
  return `${ground}, ${centimetres(Math.abs(above))} ${above > 0 ? 'higher' : 'lower'} than here`;
}
