import type { Knex } from 'knex';
import * as createAccounts from './20261201000100_create_accounts';
import * as createSurveys from './20261201000200_create_surveys';
import * as createReadings from './20261201000300_create_readings';
import * as createRuns from './20261201000400_create_runs';
import * as createInterpretations from './20261201000500_create_interpretations';
import * as createNaturalCollation from './20261201000600_create_natural_collation';
import * as addUnitsToReadingDraft from './20261201000700_add_units_to_reading_draft';
import * as createInterpretationContributors from './20261201000800_create_interpretation_contributors';
import * as addEditedToReviewEvent from './20261201000900_add_edited_to_review_event';
import * as addImportFaultsToDataRevision from './20261201001000_add_import_faults_to_data_revision';

export interface NamedMigration {
  name: string;
  migration: Knex.Migration;
}

/** In the order they run; a new migration is added at the end. */
export const migrations: readonly NamedMigration[] = [
  { name: '20261201000100_create_accounts', migration: createAccounts },
  { name: '20261201000200_create_surveys', migration: createSurveys },
  { name: '20261201000300_create_readings', migration: createReadings },
  { name: '20261201000400_create_runs', migration: createRuns },
  { name: '20261201000500_create_interpretations', migration: createInterpretations },
  { name: '20261201000600_create_natural_collation', migration: createNaturalCollation },
  { name: '20261201000700_add_units_to_reading_draft', migration: addUnitsToReadingDraft },
  {
    name: '20261201000800_create_interpretation_contributors',
    migration: createInterpretationContributors,
  },
  { name: '20261201000900_add_edited_to_review_event', migration: addEditedToReviewEvent },
  {
    name: '20261201001000_add_import_faults_to_data_revision',
    migration: addImportFaultsToDataRevision,
  },
];
