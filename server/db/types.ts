import pg from 'pg';

/**
 * A calendar date has no hour and no zone: as a Date it would move by a day east or west of Greenwich. Both Knex and the
 * shared pool read through these parsers.
 */
export function keepDatesAsText(): void {
  pg.types.setTypeParser(pg.types.builtins.DATE, (text) => text);
}
