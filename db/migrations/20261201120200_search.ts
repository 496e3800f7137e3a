import type { Knex } from 'knex'

/**
 * Search over the catalogue, in two parts.
 *
 * `items.search_text` holds what is searched, in lower case, under a trigram index: any substring is found, digits and
 * all. `items.search_words` holds its words of letters (five or more), and `search_words` every such word once, with
 * each way of leaving one letter out. Two words are one wrong, missing, extra or swapped letter apart only if they
 * share one of these (or one is among the other's), so the index finds the few candidates and `is_one_edit_apart`
 * decides. A term finds an item when
 *
 *     items.search_text LIKE '%term%' OR items.search_words && (SELECT matching_search_words('term'))
 *
 * where the SELECT has the words looked up once and not again for every row.
 * For example `carbdie` is no substring of `solid carbide ball`, but it and `carbide` both become `carbde` and so
 * `matching_search_words('carbdie')` is `{carbide}`. Digits are never forgiven: no word holds any.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE EXTENSION IF NOT EXISTS pg_trgm;

    -- A run of more than forty letters is no word anyone types, and would be costly to take apart.
    CREATE FUNCTION letter_words(searched text) RETURNS text[] LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
      SELECT coalesce(array_agg(DISTINCT found[1] ORDER BY found[1]), '{}')
      FROM regexp_matches(lower(searched), '[[:alpha:]]{5,}', 'g') AS found
      WHERE length(found[1]) <= 40
    $$;

    -- The word itself and every word that leaves out one of its letters.
    CREATE FUNCTION words_one_shorter(word text) RETURNS text[] LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
      SELECT array_agg(DISTINCT left(word, place - 1) || substr(word, place + 1)) || word
      FROM generate_series(1, length(word)) AS place
    $$;

    -- Equal, or one letter wrong, missing, extra or swapped with its neighbour.
    CREATE FUNCTION is_one_edit_apart(one text, other text) RETURNS boolean LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
      SELECT CASE length(one) - length(other)
        WHEN 0 THEN one = other OR EXISTS (
          SELECT FROM generate_series(1, length(one)) AS place
          WHERE left(one, place - 1) || substr(one, place + 1) = left(other, place - 1) || substr(other, place + 1)
            OR left(one, place - 1) || substr(one, place + 1, 1) || substr(one, place, 1) || substr(one, place + 2)
              = other)
        WHEN 1 THEN EXISTS (
          SELECT FROM generate_series(1, length(one)) AS place
          WHERE left(one, place - 1) || substr(one, place + 1) = other)
        WHEN -1 THEN EXISTS (
          SELECT FROM generate_series(1, length(other)) AS place
          WHERE left(other, place - 1) || substr(other, place + 1) = one)
        ELSE false
      END
    $$;

    ALTER TABLE items
      ADD COLUMN search_text text NOT NULL GENERATED ALWAYS AS (
        lower(code || ' ' || coalesce(maker, '') || ' ' || coalesce(part_number, '') || ' ' || description)) STORED,
      ADD COLUMN search_words text[] NOT NULL GENERATED ALWAYS AS (
        letter_words(code || ' ' || coalesce(maker, '') || ' ' || coalesce(part_number, '') || ' ' || description)) STORED;
    CREATE INDEX items_search_text_idx ON items USING gin (search_text gin_trgm_ops);
    CREATE INDEX items_search_words_idx ON items USING gin (search_words);

    -- Words are kept when their last item goes: they then match nothing, and two writers need no common count.
    CREATE TABLE search_words (
      word text PRIMARY KEY,
      one_shorter text[] NOT NULL GENERATED ALWAYS AS (words_one_shorter(word)) STORED
    );
    CREATE INDEX search_words_one_shorter_idx ON search_words USING gin (one_shorter);

    CREATE FUNCTION matching_search_words(term text) RETURNS text[] LANGUAGE sql STABLE PARALLEL SAFE AS $$
      SELECT coalesce(array_agg(word ORDER BY word), '{}')
      FROM search_words
      WHERE length(term) BETWEEN 4 AND 41
        AND one_shorter && words_one_shorter(lower(term))
        AND is_one_edit_apart(word, lower(term))
    $$;

    -- Its plans are kept for the whole connection, so only those are allowed that serve one row and many.
    CREATE FUNCTION keep_search_words() RETURNS trigger LANGUAGE plpgsql
    SET enable_seqscan = off SET enable_hashjoin = off SET enable_mergejoin = off SET jit = off AS $$
    DECLARE
      words text[];
    BEGIN
      IF TG_OP = 'INSERT' THEN
        words := ARRAY(SELECT DISTINCT unnest(search_words) FROM new_rows);
      ELSE
        words := ARRAY(SELECT unnest(search_words) FROM new_rows EXCEPT SELECT unnest(search_words) FROM old_rows);
      END IF;
      INSERT INTO search_words (word)
        SELECT fresh.word FROM unnest(words) AS fresh (word)
        WHERE NOT EXISTS (SELECT FROM search_words AS known WHERE known.word = fresh.word)
        ORDER BY fresh.word
        ON CONFLICT DO NOTHING;
      RETURN NULL;
    END $$;
    CREATE TRIGGER items_words_added AFTER INSERT ON items REFERENCING NEW TABLE AS new_rows
      FOR EACH STATEMENT EXECUTE FUNCTION keep_search_words();
    CREATE TRIGGER items_words_changed AFTER UPDATE ON items REFERENCING OLD TABLE AS old_rows NEW TABLE AS new_rows
      FOR EACH STATEMENT EXECUTE FUNCTION keep_search_words();
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER items_words_changed ON items;
    DROP TRIGGER items_words_added ON items;
    DROP FUNCTION keep_search_words(), matching_search_words(text);
    DROP TABLE search_words;
    ALTER TABLE items DROP COLUMN search_words, DROP COLUMN search_text;
    DROP FUNCTION is_one_edit_apart(text, text), words_one_shorter(text), letter_words(text);
    DROP EXTENSION pg_trgm;
  `)
}
