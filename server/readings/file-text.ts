import { AppError } from '../errors';

const SIGNATURES: readonly (readonly [bytes: readonly number[], kind: string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], 'a spreadsheet workbook or another packed file'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old spreadsheet workbook'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF'],
  [[0x89, 0x50, 0x4e, 0x47], 'a picture'],
  [[0xff, 0xd8, 0xff], 'a picture'],
  [[0x47, 0x49, 0x46, 0x38], 'a picture'],
  [[0x1f, 0x8b], 'a packed file'],
];

const SAMPLE_BYTES = 4096;

/** UTF-16 without a mark shows as zeros in every other byte; the side they stand on tells the order. */
function utf16Without(bytes: Buffer): 'utf-16le' | 'utf-16be' | null {
  const sample = bytes.subarray(0, SAMPLE_BYTES);
  const zeros = [0, 0];
  sample.forEach((byte, i) => {
    if (byte === 0) zeros[i % 2] = (zeros[i % 2] ?? 0) + 1;
  });
  const [even = 0, odd = 0] = zeros;
  const many = sample.length / 4;
  if (odd > many && even < odd / 10) return 'utf-16le';
  return even > many && odd < even / 10 ? 'utf-16be' : null;
}

function encodingOf(bytes: Buffer): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  const wide = utf16Without(bytes);
  if (wide) return wide;
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return 'utf-8';
  } catch {
    return 'windows-1252';
  }
}

/** Text holds no control characters but tab and line ends; a few are forgiven. */
function looksBinary(text: string): boolean {
  const sample = text.slice(0, SAMPLE_BYTES);
  let odd = 0;
  for (const sign of sample) {
    const code = sign.charCodeAt(0);
    if (code === 0xfffd || (code < 32 && !'\t\n\r\f\v'.includes(sign))) odd += 1;
  }
  return odd > sample.length / 100;
}

/**
 * The text of an uploaded file with \n as its only line end: UTF-8, UTF-16 or Windows-1252. Throws with what the file
 * seems to be when it is no text.
 */
export function textOfFile(name: string, bytes: Buffer): string {
  const refuse = (kind: string): never => {
    throw new AppError(
      'unsupported-media',
      `${name} is ${kind}, not a table in text. Save the sheet as CSV and upload that.`,
    );
  };
  if (bytes.length === 0) throw new AppError('invalid', `${name} is empty.`);
  const signature = SIGNATURES.find(([start]) => start.every((byte, i) => bytes[i] === byte));
  if (signature) return refuse(signature[1]);
  const text = new TextDecoder(encodingOf(bytes)).decode(bytes).replace(/\r\n?|\u2028|\u0085/g, '\n');
  if (looksBinary(text)) return refuse('a binary file');
  if (text.trim() === '') throw new AppError('invalid', `${name} holds nothing but blank space.`);
  return text;
}
