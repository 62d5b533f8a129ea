import type { DemoInterpretation } from './scenario';

/** What the demo's people have written so far. Every number in it is the run's or a borehole's; a test compares them. */
export const INTERPRETATIONS: readonly DemoInterpretation[] = [
  {
    sounding: 'S-03',
    layers: 4,
    title: 'Gravel over rock at the old well',
    narrative:
      'BH-1, 21 m away, met dry silty gravel, clay, water-bearing gravel and rock, with contacts at 1.9, 6.2 and 27.4 m. The ' +
      'run, which was not told of the hole, puts them at 1.75, 6.83 and 28.1 m; each of the hole lies within its 95 % range.\n\n' +
      'The clay is known by its conductance, 0.141 S. Its thickness and its resistivity trade against each other: that the bed ' +
      'is clay, and where it ends, is known from the hole. The base of the gravel is loosely held by the readings and closely ' +
      'by the hole. The water level is that of BH-1 in May.',
    beds: [
      {
        ground: 'dry silty gravel',
        role: 'cover',
        confidence: 'well-supported',
        otherCandidates: 'dry sand',
      },
      { ground: 'clay with stones', role: 'aquitard', confidence: 'likely', otherCandidates: 'silt' },
      {
        ground: 'sandy gravel, water-bearing',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: 'weathered rock',
      },
      {
        ground: 'crystalline rock',
        role: 'basement',
        confidence: 'well-supported',
        otherCandidates: 'cemented gravel',
      },
    ],
    waterLevelDepthM: 6.4,
    end: 'accepted',
  },
  {
    sounding: 'S-09',
    layers: 4,
    title: 'Gravel over marl at the village',
    narrative:
      'BH-2, 13 m away, met silt, clay, gravel and marl, with contacts at 2.0, 6.5 and 30.6 m. The run, which was not told of ' +
      'the hole, puts them at 1.91, 6.00 and 32.2 m; each of the hole lies within its 95 % range.\n\n' +
      'The product of thickness and resistivity of the gravel is well held, 2610 Ω·m². Its thickness alone is not: 26.2 m in ' +
      'the run, 24.1 m in the hole, and the readings would bear anything from 14.1 to 32.6 m. Of the clay they tell the ' +
      'conductance, 0.220 S; its name and its thickness come from the hole. The water level is that of BH-2 in May.',
    beds: [
      {
        ground: 'sandy silt, dry',
        role: 'cover',
        confidence: 'well-supported',
        otherCandidates: 'dry clayey gravel',
      },
      { ground: 'grey clay', role: 'aquitard', confidence: 'likely', otherCandidates: 'silty sand' },
      {
        ground: 'gravel and coarse sand, water-bearing',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: 'gravel with silt',
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
      'The curve asks for a thick bed of 137 Ω·m, from 7.05 to 38.4 m, between a conductive bed and a conductive base of ' +
      '12.0 Ω·m. By likeness with BH-2, 285 m to the east, the thick bed is read as water-bearing gravel. Three beds do not ' +
      'explain the readings.\n\n' +
      'What the sounding does not tell: whether the conductive base is marl, as in BH-2, or holds brackish water, as in BH-4. ' +
      'The clay is known by its conductance, 0.166 S, not by its thickness. One reading is left out with its reason.\n\n' +
      'A test hole through the thick bed and a few metres into the conductive ground below it would show whether the thick ' +
      'bed is water-bearing gravel. Its samples, and the conductivity of the water measured as it is drilled, would tell marl ' +
      'from gravel with brackish water.',
    beds: [
      {
        ground: 'dry gravelly soil',
        role: 'cover',
        confidence: 'well-supported',
        otherCandidates: 'dry sand',
      },
      { ground: 'clay', role: 'aquitard', confidence: 'possible', otherCandidates: 'silt' },
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
      'Ground of 70.9 Ω·m down to 18.2 m, and 3.87 Ω·m below. BH-4, 16 m away, met brackish water at 18.1 m, which lies within ' +
      'the 95 % range of that contact.\n\n' +
      'The resistivity of the lowest bed is well held and far below that of the marl at the village. Clay soaked with brackish ' +
      'water would look the same; that it is sand and gravel is known from the hole. The water level is that of BH-4 in May.',
    beds: [
      { ground: 'sandy soil', role: 'cover', confidence: 'well-supported', otherCandidates: 'sandy silt' },
      {
        ground: 'sand and gravel, fresh water',
        role: 'aquifer',
        confidence: 'well-supported',
        otherCandidates: 'sand with some silt',
      },
      {
        ground: 'sand and gravel, brackish water',
        role: 'saline',
        confidence: 'likely',
        otherCandidates: 'clay with brackish water',
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
      'Two beds explain the readings already; three, on which this stands, pass closer: 48.0, 250 and 1450 Ω·m with contacts at ' +
      '10.6 and 27.9 m. Neither contact is well held, and another model of three beds fits nearly as well.\n\n' +
      'Geology expects weathered rock between the gravel and the fresh rock. With four beds the misfit is smaller again, yet ' +
      'the curve neither asks for such a bed nor forbids one.',
    beds: [
      { ground: 'silt and sand', role: 'cover', confidence: 'likely', otherCandidates: 'clayey gravel' },
      {
        ground: 'gravel or weathered rock',
        role: 'unknown',
        confidence: 'possible',
        otherCandidates: 'gravel over weathered rock',
      },
      {
        ground: 'crystalline rock',
        role: 'basement',
        confidence: 'likely',
        otherCandidates: 'less weathered rock',
      },
    ],
    waterLevelDepthM: null,
    end: 'draft',
  },
];
