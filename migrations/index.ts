import type { Knex } from 'knex';
import * as people from './20261201000100_create_people';
import * as projects from './20261201000200_create_projects';
import * as calculations from './20261201000300_create_calculations';
import * as documents from './20261201000400_create_documents';
import * as check from './20261201000500_create_check';
import * as trail from './20261201000600_create_trail';
import * as lockedRevisions from './20261201000700_keep_locked_revisions';
import * as signedParts from './20261201000800_keep_signed_parts';
import * as summaryFigures from './20261201000900_add_summary_figures';
import * as signersNames from './20261201001000_keep_signers_names';
import * as indexPeople from './20261201001100_index_people';

/** In the order in which they are applied. Names stay for good: the database remembers them. */
const migrations: readonly (readonly [name: string, migration: Knex.Migration])[] = [
  ['20261201000100_create_people', people],
  ['20261201000200_create_projects', projects],
  ['20261201000300_create_calculations', calculations],
  ['20261201000400_create_documents', documents],
  ['20261201000500_create_check', check],
  ['20261201000600_create_trail', trail],
  ['20261201000700_keep_locked_revisions', lockedRevisions],
  ['20261201000800_keep_signed_parts', signedParts],
  ['20261201000900_add_summary_figures', summaryFigures],
  ['20261201001000_keep_signers_names', signersNames],
  ['20261201001100_index_people', indexPeople],
];

export const migrationSource: Knex.MigrationSource<readonly [string, Knex.Migration]> = {
  getMigrations: () => Promise.resolve([...migrations]),
  getMigrationName: ([name]) => name,
  getMigration: ([, migration]) => Promise.resolve(migration),
};
