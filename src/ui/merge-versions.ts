export type VersionChoice = 'mine' | 'theirs';

export interface VersionField {
  key: string;
  label: string;
  /** As it stood when the editing began. */
  base: string;
  mine: string;
  theirs: string;
}

export interface VersionClash extends VersionField {
  /** Both changed it, each otherwise: only a person can choose. */
  isContested: boolean;
  choice: VersionChoice;
}

/** Fields in which two versions differ, with the choice that loses nothing: whoever changed it, and mine where both did. */
export function clashesOf(fields: readonly VersionField[]): VersionClash[] {
  return fields
    .filter((field) => field.mine !== field.theirs)
    .map((field) => ({
      ...field,
      isContested: field.mine !== field.base && field.theirs !== field.base,
      choice: field.mine === field.base ? 'theirs' : 'mine',
    }));
}
