import { requireValue } from './require-value';

/**
 * Classes of protective capacity by the conductance S of the cover in siemens, lowest first. The printed classes leave
 * gaps and share their ends, so each is half-open here: `from` ≤ S < `to`. Source: after Henriet 1976 and later classes (from memory).
 */
export const PROTECTIVE_CLASSES = [
  { name: 'poor', from: 0, to: 0.1 },
  { name: 'weak', from: 0.1, to: 0.2 },
  { name: 'moderate', from: 0.2, to: 0.7 },
  { name: 'good', from: 0.7, to: 5 },
  { name: 'very good', from: 5, to: 10 },
  { name: 'excellent', from: 10, to: Infinity },
] as const;

export type ProtectiveClass = (typeof PROTECTIVE_CLASSES)[number]['name'];

export const PROTECTIVE_CLASSES_NOTE =
  'The printed classes leave gaps; here each holds its lower end and not its upper one (0.2 S is moderate, 0.7 S is good).';

/** The class of a cover of conductance S ≥ 0 in siemens. */
export function protectiveClass(conductanceS: number): ProtectiveClass {
  if (conductanceS !== 0) requireValue(conductanceS, 'conductanceS', 'S');
  return PROTECTIVE_CLASSES.findLast(({ from }) => conductanceS >= from)!.name;
}

/** The class at the best estimate, and the share of the ensemble's members in each class, lowest class first. */
export function protectiveCapacity(
  conductanceS: number,
  members: readonly number[] = [],
): { class: ProtectiveClass; chances: { class: ProtectiveClass; chance: number }[] | null } {
  const found = members.map(protectiveClass);
  const chances = PROTECTIVE_CLASSES.map(({ name }) => ({
    class: name,
    chance: found.filter((one) => one === name).length / members.length,
  }));
  return { class: protectiveClass(conductanceS), chances: members.length === 0 ? null : chances };
}
