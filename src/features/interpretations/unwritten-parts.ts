import type { Interpretation } from '../../../server/contract/interpretations';

const list = new Intl.ListFormat('en-GB', { style: 'long', type: 'conjunction' });

/** What a reviewer would find empty, each as a sentence: beds without a ground, no narrative. */
export function unwrittenParts({ beds, narrative }: Pick<Interpretation, 'beds' | 'narrative'>): string[] {
  const unnamed = beds.filter((bed) => bed.ground.trim() === '').map((bed) => String(bed.layerIndex + 1));
  const parts: string[] = [];
  if (unnamed.length > 0 && unnamed.length === beds.length) parts.push('No bed is named.');
  else if (unnamed.length === 1) parts.push(`Bed ${unnamed[0]} is not named.`);
  else if (unnamed.length > 1) parts.push(`Beds ${list.format(unnamed)} are not named.`);
  if (narrative.trim() === '') parts.push('The narrative is empty.');
  return parts;
}
