import { sideBySideAddress } from '../runs/ticked-runs';
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

/** `ticked`: runs chosen for Side by side. */
export function soundingSections(soundingId: string, ticked: readonly string[]): SectionLink[] {
  return [
    { to: addressOf('readings', { soundingId }), label: 'Field sheet' },
    { to: addressOf('bench', { soundingId }), label: 'Bench' },
    { to: sideBySideAddress(soundingId, ticked), label: 'Side by side' },
    { to: addressOf('interpretations', { soundingId }), label: 'Interpretation' },
  ];
}
