/** Whether a 95 % range is that of a held value: the value itself at both ends, to the last bit. */
export function isHeldRange([low, high]: readonly [number | null, number | null]): boolean {
  return low !== null && low === high;
}
