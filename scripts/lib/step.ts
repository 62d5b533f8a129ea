const seconds = (from: number) => `${((Date.now() - from) / 1000).toFixed(1)} s`;

const patience = 2_500;

export const say = (line: string) => console.log(`  ${line}`);

/** One line of progress: what is done, then how it ended and how long it took. */
export async function step<T>(
  name: string,
  work: (say: (line: string) => void) => Promise<T>,
  result?: (value: T) => string,
): Promise<T> {
  const from = Date.now();
  // A person who waits longer than a moment is told for what.
  const timer = setTimeout(() => console.log(`· ${name} …`), patience);
  const value = await work((line) => console.log(`· ${name}: ${line}`)).finally(() => clearTimeout(timer));
  const detail = result?.(value) ?? '';
  console.log(`✓ ${name}${detail === '' ? '' : `: ${detail}`} (${seconds(from)})`);
  return value;
}
