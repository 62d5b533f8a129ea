import type { DemoInterpretation } from './scenario';

/** What the demo's people have written so far; numbers are left to the runs they stand on. */
export const INTERPRETATIONS: readonly DemoInterpretation[] = [
  {
    sounding: 'S-03',
    layers: 4,
    title: 'Gravel over rock at the old well',
    narrative:
      'Dry gravel over a clay bed, then the water-bearing gravel of BH-1, then rock.\n\n' +
      'The base of the gravel agrees with the contact in BH-1 within the interval of the fit. The clay is known by its ' +
      'conductance only; its thickness is taken from the borehole, not from the sounding.',
    beds: [
      { ground: 'dry silty gravel', role: 'cover', confidence: 'well-supported', otherCandidates: '' },
      { ground: 'clay with stones', role: 'aquitard', confidence: 'likely', otherCandidates: 'silt' },
      {
        ground: 'sandy gravel, water-bearing',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: '',
      },
      { ground: 'crystalline rock', role: 'basement', confidence: 'well-supported', otherCandidates: '' },
    ],
    waterLevelDepthM: 6.4,
    end: 'accepted',
  },
  {
    sounding: 'S-09',
    layers: 4,
    title: 'Gravel over marl at the village',
    narrative:
      'The sounding stands beside BH-2 and shows the same order: cover, clay, gravel, marl.\n\n' +
      'Product of thickness and resistivity of the gravel is well held; thickness alone is not, and follows the borehole.',
    beds: [
      { ground: 'sandy silt, dry', role: 'cover', confidence: 'well-supported', otherCandidates: '' },
      { ground: 'grey clay', role: 'aquitard', confidence: 'likely', otherCandidates: 'silty sand' },
      {
        ground: 'gravel and coarse sand, water-bearing',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: '',
      },
      { ground: 'marl', role: 'aquitard', confidence: 'likely', otherCandidates: 'clay; brackish gravel' },
    ],
    waterLevelDepthM: 3.9,
    end: 'accepted',
  },
  {
    sounding: 'S-07',
    layers: 4,
    title: 'Proposed site of the second well',
    narrative:
      'The curve asks for a thick bed of moderate resistivity below a thin conductive one. By likeness with BH-2, three ' +
      'hundred metres to the east, the thick bed is read as water-bearing gravel.\n\n' +
      'What the sounding does not tell: whether the conductive base is marl, as in BH-2, or brackish water, as in BH-4. ' +
      'Thickness of the clay is not known apart from its resistivity. One reading is left out with its reason.\n\n' +
      'A test hole to the base of the gravel, with conductivity of the water measured as it is drilled, would decide both.',
    beds: [
      { ground: 'dry gravelly soil', role: 'cover', confidence: 'well-supported', otherCandidates: '' },
      { ground: 'clay, thin', role: 'aquitard', confidence: 'possible', otherCandidates: 'silt, thicker' },
      {
        ground: 'gravel and sand',
        role: 'aquifer',
        confidence: 'likely',
        otherCandidates: 'weathered rock; dry sand',
      },
      {
        ground: 'marl',
        role: 'aquitard',
        confidence: 'possible',
        otherCandidates: 'clay; gravel with brackish water',
      },
    ],
    waterLevelDepthM: null,
    end: 'in-review',
  },
  {
    sounding: 'S-18',
    layers: 3,
    title: 'Brackish water below the lower meadow',
    narrative:
      'Sand and gravel over a very conductive half-space. BH-4, a few metres away, met brackish water near the depth of ' +
      'the contact. The resistivity of the lowest bed is too low for marl.',
    beds: [
      { ground: 'sandy soil', role: 'cover', confidence: 'well-supported', otherCandidates: '' },
      {
        ground: 'sand and gravel, fresh water',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: '',
      },
      {
        ground: 'sand and gravel, brackish water',
        role: 'saline',
        confidence: 'well-supported',
        otherCandidates: '',
      },
    ],
    waterLevelDepthM: 1.9,
    end: 'in-review',
  },
  {
    sounding: 'S-12',
    layers: 3,
    title: 'Rock near the middle of the line',
    narrative:
      'Three beds fit within the noise. Geology expects weathered rock between the gravel and the fresh rock; the curve ' +
      'neither asks for such a bed nor forbids one.',
    beds: [
      { ground: 'silt and sand', role: 'cover', confidence: 'likely', otherCandidates: 'clayey gravel' },
      {
        ground: 'gravel or weathered rock',
        role: 'unknown',
        confidence: 'possible',
        otherCandidates: 'both',
      },
      { ground: 'crystalline rock', role: 'basement', confidence: 'likely', otherCandidates: '' },
    ],
    waterLevelDepthM: null,
    end: 'draft',
  },
];
