/** SVG has no elements of its own for these, so a group takes the role; a screen reader then treats it like one. */
interface SvgRole {
  role: 'button' | 'group' | 'img' | 'slider';
  'aria-label': string;
}

export function svgRole(role: SvgRole['role'], label: string): SvgRole {
  return { role, 'aria-label': label };
}
