import { readFileSync } from 'node:fs';

export interface UploadedFile {
  name: string;
  mimeType: string;
  buffer: Buffer;
}

const asFile = (name: string, text: string): UploadedFile => ({
  name,
  mimeType: 'text/csv',
  buffer: Buffer.from(text),
});

export const publishedText = (name: string): string =>
  readFileSync(new URL(`../../published/${name}`, import.meta.url), 'utf8');

export const publishedFile = (name: string): UploadedFile => asFile(name, publishedText(name));

/** A published file with some of its lines replaced, by their number from 1. */
export function brokenCopy(name: string, lines: Readonly<Record<number, string>>): UploadedFile {
  const text = publishedText(name)
    .trimEnd()
    .split('\n')
    .map((line, i) => lines[i + 1] ?? line)
    .join('\n');
  return asFile(`broken-${name}`, `${text}\n`);
}
