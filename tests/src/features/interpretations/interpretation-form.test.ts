import { expect, it } from 'vitest';
import {
  interpretationVersions,
  mergedInterpretation,
  type InterpretationForm,
} from '../../../../src/features/interpretations/interpretation-form';
import { clashesOf } from '../../../../src/ui/merge-versions';

const bed = (layerIndex: number, ground = '') => ({
  layerIndex,
  ground,
  role: 'unknown' as const,
  confidence: 'unstated' as const,
  otherCandidates: '',
});
const base: InterpretationForm = {
  title: 'Ground',
  narrative: '',
  waterLevelDepthM: null,
  beds: [bed(0), bed(1)],
};
const mine: InterpretationForm = { ...base, narrative: 'My words', beds: [bed(0, 'sand'), bed(1)] };
const theirs: InterpretationForm = {
  ...base,
  waterLevelDepthM: 8.5,
  beds: [bed(0, 'gravel'), { ...bed(1), role: 'aquifer' }],
};

it('shows every field in which two versions differ, each bed’s apart, in words', () => {
  const clashes = clashesOf(interpretationVersions({ base, mine, theirs }));
  expect(clashes.map(({ label, mine: own, theirs: other, choice }) => [label, own, other, choice])).toEqual([
    ['Bed 1, ground', 'sand', 'gravel', 'mine'],
    ['Bed 2, role', 'Not known', 'Aquifer', 'theirs'],
    ['Water level', '', '8.5\u00a0m', 'theirs'],
    ['Narrative', 'My words', '', 'mine'],
  ]);
});

it('takes exactly the chosen fields from the other version and loses none of mine', () => {
  const merged = mergedInterpretation(mine, theirs, new Set(['role 1', 'waterLevelDepthM']));
  expect(merged).toEqual({
    title: 'Ground',
    narrative: 'My words',
    waterLevelDepthM: 8.5,
    beds: [bed(0, 'sand'), { ...bed(1), role: 'aquifer' }],
  });
});

it('takes a bed field of the bed it is about, not of the bed at that place in the list', () => {
  const turned = { ...theirs, beds: theirs.beds.toReversed() };
  expect(mergedInterpretation(mine, turned, new Set(['ground 0'])).beds[0]?.ground).toBe('gravel');
});
