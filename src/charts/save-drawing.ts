import mono400 from '@fontsource/ibm-plex-mono/files/ibm-plex-mono-latin-400-normal.woff2?url';
import mono600 from '@fontsource/ibm-plex-mono/files/ibm-plex-mono-latin-600-normal.woff2?url';
import greek400 from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-greek-400-normal.woff2?url';
import sans400 from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?url';
import sans600 from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-600-normal.woff2?url';

const FACES = [
  { family: 'IBM Plex Sans', weight: 400, url: sans400, range: '' },
  { family: 'IBM Plex Sans', weight: 600, url: sans600, range: '' },
  { family: 'IBM Plex Sans', weight: 400, url: greek400, range: 'unicode-range:U+0370-03FF;' },
  { family: 'IBM Plex Mono', weight: 400, url: mono400, range: '' },
  { family: 'IBM Plex Mono', weight: 600, url: mono600, range: '' },
];

/** Pixels of a saved picture for each pixel on screen. */
const PICTURE_SCALE = 3;

/** Room over the drawing for its title, px. */
const HEAD = 36;

export interface Drawing {
  svg: SVGSVGElement;
  title: string;
  background: string;
  ink: string;
}

/** The drawing under its title as one SVG text that carries its fonts and its ground, so that it looks the same anywhere. */
export async function drawingToSvg({ svg, title, background, ink }: Drawing): Promise<string> {
  const { width, height } = drawingSize(svg);
  const copy = svg.cloneNode(true) as SVGSVGElement;
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  copy.setAttribute('width', String(width));
  copy.setAttribute('height', String(height));
  copy.setAttribute('viewBox', `0 ${-HEAD} ${width} ${height}`);
  copy.removeAttribute('class');
  copy.removeAttribute('style');
  copy.querySelectorAll('[data-screen-only]').forEach((element) => element.remove());
  const ground = svgElement('rect', { y: -HEAD, width, height, fill: background });
  const style = svgElement('style', {});
  style.textContent = (await Promise.all(FACES.map(fontFace))).join('');
  const words = {
    x: 12,
    y: -12,
    fill: ink,
    'font-family': 'IBM Plex Sans',
    'font-weight': 600,
    'font-size': 15,
  };
  const heading = svgElement('text', words);
  heading.textContent = title;
  copy.prepend(style, ground);
  copy.append(heading);
  return new XMLSerializer().serializeToString(copy);
}

/** The drawing as a PNG, three pixels for one. */
export async function drawingToPng(drawing: Drawing): Promise<Blob> {
  const { width, height } = drawingSize(drawing.svg);
  const text = await drawingToSvg(drawing);
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(text)}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = width * PICTURE_SCALE;
  canvas.height = height * PICTURE_SCALE;
  await drawSettled(canvas, image);
  return new Promise((resolve, reject) => {
    canvas.toBlob(
      (blob) => (blob ? resolve(blob) : reject(new Error('The picture could not be made.'))),
      'image/png',
    );
  });
}

/** Fonts inside a picture load after it: it is drawn anew until two drawings in a row are the same. */
async function drawSettled(canvas: HTMLCanvasElement, image: HTMLImageElement): Promise<void> {
  const context = canvas.getContext('2d');
  if (!context) throw new Error('This browser gives no canvas to draw the picture on; save as SVG instead.');
  let last = '';
  let same = 0;
  for (let attempt = 0; attempt < 15 && same < 2; attempt++) {
    context.drawImage(image, 0, 0, canvas.width, canvas.height);
    const now = canvas.toDataURL('image/png');
    same = now === last ? same + 1 : 0;
    last = now;
    await new Promise((resolve) => setTimeout(resolve, 60));
  }
}

function svgElement(name: string, attributes: Record<string, string | number>): SVGElement {
  const element = document.createElementNS('http://www.w3.org/2000/svg', name);
  Object.entries(attributes).forEach(([key, value]) => element.setAttribute(key, String(value)));
  return element;
}

function drawingSize(svg: SVGSVGElement): { width: number; height: number } {
  const box = svg.getBoundingClientRect();
  return { width: Math.ceil(box.width), height: Math.ceil(box.height) + HEAD };
}

async function fontFace({ family, weight, url, range }: (typeof FACES)[number]): Promise<string> {
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  const code = btoa(Array.from(bytes, (byte) => String.fromCharCode(byte)).join(''));
  return `@font-face{font-family:'${family}';font-weight:${weight};${range}src:url(data:font/woff2;base64,${code}) format('woff2')}`;
}
