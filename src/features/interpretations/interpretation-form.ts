import type { z } from 'zod';
import {
  updateInterpretationSchema,
  type Interpretation,
  type InterpretationBed,
} from '../../../server/contract/interpretations';
import { formatGivenLength, withUnit } from '../../ui/format';
import type { VersionField } from '../../ui/merge-versions';
import { BED_ROLE_WORDS, CONFIDENCE_WORDS } from './interpretation-words';

export const interpretationFormSchema = updateInterpretationSchema.required();
export type InterpretationForm = z.infer<typeof interpretationFormSchema>;

export const formOf = (interpretation: Interpretation): InterpretationForm => ({
  title: interpretation.title,
  narrative: interpretation.narrative,
  waterLevelDepthM: interpretation.waterLevelDepthM,
  beds: interpretation.beds,
});

type BedField = Exclude<keyof InterpretationBed, 'layerIndex'>;

const BED_FIELDS: { key: BedField; label: string; show: (bed: InterpretationBed) => string }[] = [
  { key: 'ground', label: 'ground', show: (bed) => bed.ground },
  { key: 'role', label: 'role', show: (bed) => BED_ROLE_WORDS[bed.role] },
  { key: 'confidence', label: 'confidence', show: (bed) => CONFIDENCE_WORDS[bed.confidence] },
  { key: 'otherCandidates', label: 'other candidates', show: (bed) => bed.otherCandidates },
];

const metres = (depth: number | null): string =>
  depth === null || Number.isNaN(depth) ? '' : withUnit(formatGivenLength(depth), 'm');

const bedAt = (form: InterpretationForm, layerIndex: number): InterpretationBed | undefined =>
  form.beds.find((bed) => bed.layerIndex === layerIndex);

interface Versions {
  base: InterpretationForm;
  mine: InterpretationForm;
  theirs: InterpretationForm;
}

/** Every field of both versions, each bed's apart, for the choice between them. */
export function interpretationVersions({ base, mine, theirs }: Versions): VersionField[] {
  const field = (key: string, label: string, show: (form: InterpretationForm) => string): VersionField => ({
    key,
    label,
    base: show(base),
    mine: show(mine),
    theirs: show(theirs),
  });
  return [
    field('title', 'Title', (form) => form.title),
    ...theirs.beds.flatMap(({ layerIndex }) =>
      BED_FIELDS.map(({ key, label, show }) =>
        field(`${key} ${layerIndex}`, `Bed ${layerIndex + 1}, ${label}`, (form) => {
          const bed = bedAt(form, layerIndex);
          return bed ? show(bed) : '';
        }),
      ),
    ),
    field('waterLevelDepthM', 'Water level', (form) => metres(form.waterLevelDepthM)),
    field('narrative', 'Narrative', (form) => form.narrative),
  ];
}

/** My version with the fields in `takeTheirs` from the other one. */
export function mergedInterpretation(
  mine: InterpretationForm,
  theirs: InterpretationForm,
  takeTheirs: ReadonlySet<string>,
): InterpretationForm {
  const beds = mine.beds.map((bed): InterpretationBed => {
    const other = bedAt(theirs, bed.layerIndex);
    const taken = BED_FIELDS.filter(({ key }) => takeTheirs.has(`${key} ${bed.layerIndex}`));
    return other ? { ...bed, ...Object.fromEntries(taken.map(({ key }) => [key, other[key]])) } : bed;
  });
  return {
    title: takeTheirs.has('title') ? theirs.title : mine.title,
    narrative: takeTheirs.has('narrative') ? theirs.narrative : mine.narrative,
    waterLevelDepthM: takeTheirs.has('waterLevelDepthM') ? theirs.waterLevelDepthM : mine.waterLevelDepthM,
    beds,
  };
}
