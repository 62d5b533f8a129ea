import type { SoundingState } from '../../../server/contract/soundings';
import type { Survey } from '../../../server/contract/surveys';

export interface WaitingQuestion {
  survey: Survey;
  state: SoundingState;
}

/** Which states of a sounding wait for this person, survey by survey: decisions for who decides, changes for who writes. */
export function waitingQuestions(surveys: readonly Survey[]): WaitingQuestion[] {
  return surveys.flatMap((survey) => {
    const questions: WaitingQuestion[] = [];
    if (survey.can.decide && survey.progress.inReview > 0) questions.push({ survey, state: 'in-review' });
    if (survey.can.submit && survey.progress.interpreted > 0)
      questions.push({ survey, state: 'changes-asked' });
    return questions;
  });
}
