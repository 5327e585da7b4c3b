import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * Text as it is searched: without accents and in small letters. The same letters that do not come apart into a letter
 * and a mark are written out as in shared/domain/plain-text.ts. Written in SQL: the `unaccent` extension is not on
 * every server, and is not immutable.
 */
export class PlainText1764600000029 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE FUNCTION plain_text(words text) RETURNS text LANGUAGE sql IMMUTABLE STRICT PARALLEL SAFE AS $$
        SELECT lower(regexp_replace(normalize(
                 replace(replace(replace(replace(translate(words, 'ØøŁłĐđı', 'OoLlDdi'),
                   'Æ', 'AE'), 'æ', 'ae'), 'Œ', 'OE'), 'œ', 'oe'), NFD), '[\u0300-\u036f]', '', 'g'))
      $$`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
