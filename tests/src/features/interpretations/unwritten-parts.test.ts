import { expect, it } from 'vitest';
import { unwrittenParts } from '../../../../src/features/interpretations/unwritten-parts';

const written = (grounds: string[], narrative: string) => ({
  narrative,
  beds: grounds.map((ground, layerIndex) => ({
    layerIndex,
    ground,
    role: 'unknown' as const,
    confidence: 'unstated' as const,
    otherCandidates: '',
  })),
});

it.each([
  [['', ' '], '', ['No bed is named.', 'The narrative is empty.']],
  [['sand', '', 'clay'], 'Sand over clay.', ['Bed 2 is not named.']],
  [['sand', '', '', ''], '  \n', ['Beds 2, 3 and 4 are not named.', 'The narrative is empty.']],
  [['sand', 'clay'], 'Sand over clay.', []],
])('names what is empty in %j', (grounds, narrative, parts) => {
  expect(unwrittenParts(written(grounds, narrative))).toEqual(parts);
});
