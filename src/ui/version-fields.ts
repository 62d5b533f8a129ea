import type { VersionField } from './merge-versions';

type Row = Readonly<Record<string, unknown>>;

/** Fields of a row for the choice between versions, in the order of `labels`. */
export function versionFields<Key extends string>(
  labels: Readonly<Record<Key, string>>,
  versions: { base: Row; mine: Row; theirs: Row },
  showValue: (key: Key, value: unknown) => string = (_, value) => plainText(value),
): VersionField[] {
  return (Object.keys(labels) as Key[]).map((key) => ({
    key,
    label: labels[key],
    base: showValue(key, versions.base[key]),
    mine: showValue(key, versions.mine[key]),
    theirs: showValue(key, versions.theirs[key]),
  }));
}

/** My row with the fields of `takeTheirs` from the other one. */
export function mergeRows<Mine extends object>(
  mine: Mine,
  theirs: Row,
  takeTheirs: ReadonlySet<string>,
): Mine {
  const taken = Object.entries(theirs).filter(([key]) => key in mine && takeTheirs.has(key));
  return { ...mine, ...Object.fromEntries(taken) };
}

export function plainText(value: unknown): string {
  if (value === null || value === undefined) return '';
  return typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean'
    ? String(value)
    : JSON.stringify(value);
}
