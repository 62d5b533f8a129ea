import type { SectionLink } from '../ui/section-nav';
import { addressOf } from './addresses';

export function surveySections(surveyId: string): SectionLink[] {
  return [
    { to: addressOf('survey', { surveyId }), label: 'Overview', end: true },
    { to: addressOf('surveySoundings', { surveyId }), label: 'Soundings' },
    { to: addressOf('surveyBoreholes', { surveyId }), label: 'Boreholes' },
    { to: addressOf('surveyMembers', { surveyId }), label: 'Members' },
  ];
}

export function soundingSections(soundingId: string): SectionLink[] {
  return [
    { to: addressOf('readings', { soundingId }), label: 'Field sheet' },
    { to: addressOf('bench', { soundingId }), label: 'Bench' },
    { to: addressOf('sideBySide', { soundingId }), label: 'Side by side' },
    { to: addressOf('interpretations', { soundingId }), label: 'Interpretation' },
  ];
}
