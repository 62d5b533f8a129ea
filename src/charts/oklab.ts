/** A colour of the OKLab space (Ottosson 2020): lightness 0…1 and two opponent axes; distances in it are near even to the eye. */
export interface Oklab {
  readonly l: number;
  readonly a: number;
  readonly b: number;
}

export type LinearRgb = readonly [number, number, number];

export function oklabFromPolar(l: number, chroma: number, hueDegrees: number): Oklab {
  const hue = (hueDegrees * Math.PI) / 180;
  return { l, a: chroma * Math.cos(hue), b: chroma * Math.sin(hue) };
}

export function oklabToLinearRgb({ l, a, b }: Oklab): LinearRgb {
  const long = (l + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const medium = (l - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const short = (l - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * long - 3.3077115913 * medium + 0.2309699292 * short,
    -1.2684380046 * long + 2.6097574011 * medium - 0.3413193965 * short,
    -0.0041960863 * long - 0.7034186147 * medium + 1.707614701 * short,
  ];
}

export function linearRgbToOklab([red, green, blue]: LinearRgb): Oklab {
  const long = Math.cbrt(0.4122214708 * red + 0.5363325363 * green + 0.0514459929 * blue);
  const medium = Math.cbrt(0.2119034982 * red + 0.6806995451 * green + 0.1073969566 * blue);
  const short = Math.cbrt(0.0883024619 * red + 0.2817188376 * green + 0.6299787005 * blue);
  return {
    l: 0.2104542553 * long + 0.793617785 * medium - 0.0040720468 * short,
    a: 1.9779984951 * long - 2.428592205 * medium + 0.4505937099 * short,
    b: 0.0259040371 * long + 0.7827717662 * medium - 0.808675766 * short,
  };
}

export function oklabDistance(first: Oklab, second: Oklab): number {
  return Math.hypot(first.l - second.l, first.a - second.a, first.b - second.b);
}

export function linearRgbToHex(rgb: LinearRgb): string {
  const channel = (linear: number) => {
    const bounded = Math.min(1, Math.max(0, linear));
    const coded = bounded <= 0.0031308 ? 12.92 * bounded : 1.055 * bounded ** (1 / 2.4) - 0.055;
    return Math.round(coded * 255)
      .toString(16)
      .padStart(2, '0');
  };
  return `#${rgb.map(channel).join('')}`;
}

export function hexToLinearRgb(hex: string): LinearRgb {
  const channel = (at: number) => {
    const coded = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return coded <= 0.04045 ? coded / 12.92 : ((coded + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

export function hexToOklab(hex: string): Oklab {
  return linearRgbToOklab(hexToLinearRgb(hex));
}

/** A colour laid over a ground as a browser does it, channel by channel. */
export function overlaid(hex: string, opacity: number, groundHex: string): string {
  const channel = (at: number) => {
    const [top, ground] = [hex, groundHex].map((color) => Number.parseInt(color.slice(at, at + 2), 16));
    return Math.round((top ?? 0) * opacity + (ground ?? 0) * (1 - opacity))
      .toString(16)
      .padStart(2, '0');
  };
  return `#${[1, 3, 5].map(channel).join('')}`;
}

/** Contrast of two colours, 1…21 (WCAG 2.2). */
export function contrastRatio(firstHex: string, secondHex: string): number {
  const luminance = (hex: string) => {
    const [red, green, blue] = hexToLinearRgb(hex);
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  };
  const [light, dark] = [luminance(firstHex), luminance(secondHex)].toSorted((x, y) => y - x);
  return ((light ?? 1) + 0.05) / ((dark ?? 0) + 0.05);
}
