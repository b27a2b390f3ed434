/**
 * Tables of the dictionary, for a migration to run in order as the database's owner, after
 * `house (id uuid primary key)`. Rows without a house are everyone's; a house's own entries
 * carry its id.
 */
export const DICTIONARY_TABLES: readonly string[] = [
  'create extension if not exists pg_trgm',
  `create table dictionary_entry (
     key bigint generated always as identity primary key,
     id text not null check (length(id) <= 300),
     house_id uuid references house (id) on delete cascade,
     origin text not null check (origin in ('curated', 'inventory', 'house')),
     inci text not null check (length(inci) <= 500),
     functions text[] not null,
     search text not null,
     entry jsonb not null,
     hash text not null,
     release text not null)`,
  'create unique index dictionary_entry_common on dictionary_entry (id) where house_id is null',
  'create unique index dictionary_entry_own on dictionary_entry (house_id, id) where house_id is not null',
  'create index dictionary_entry_inci on dictionary_entry (inci)',
  'create index dictionary_entry_search on dictionary_entry using gin (search gin_trgm_ops)',
  'create index dictionary_entry_functions on dictionary_entry using gin (functions)',
  `create table dictionary_term (
     entry_key bigint not null references dictionary_entry (key) on delete cascade,
     term text not null,
     words text not null,
     folded text not null,
     kind text not null check (kind in ('inci', 'synonym', 'common-name', 'cas', 'respelt')))`,
  'create index dictionary_term_entry on dictionary_term (entry_key)',
  'create index dictionary_term_folded on dictionary_term (folded text_pattern_ops)',
  // Short names share too few letter groups with their misspellings: those are found by length.
  'create index dictionary_term_short on dictionary_term (length(folded)) where length(folded) <= 8',
  'create index dictionary_term_words on dictionary_term using gin (words gin_trgm_ops)',
  // The planner thinks comparing letter groups costs nothing and would read the whole table;
  // here it may not, so each way in goes by its index.
  // Part of a longer name is looked for only where whole names and beginnings give nothing near:
  // that way in costs as much as all the others together.
  `create function dictionary_near(asked text, pattern text, shortest int, longest int) returns setof dictionary_term
   language plpgsql stable set enable_seqscan = off set pg_trgm.similarity_threshold = 0.45 as $near$
   declare
     begun int;
     nearest real;
     found dictionary_term;
   begin
     return query execute 'select * from dictionary_term where folded like $1 order by length(folded), folded limit 40' using pattern;
     get diagnostics begun = row_count;
     nearest := 0;
     for found in execute 'select * from dictionary_term where words % $1 and kind <> ''cas'' order by similarity(words, $1) desc limit 50' using asked loop
       nearest := greatest(nearest, similarity(found.words, asked));
       return next found;
     end loop;
     if begun < 8 and nearest < 0.5 then
       return query execute 'select * from dictionary_term where $1 <% words and kind <> ''cas'' order by word_similarity($1, words) desc, length(words) limit 30' using asked;
     end if;
     if longest >= shortest then
       return query execute 'select * from dictionary_term where length(folded) <= 8 and length(folded) between $1 and $2 and kind <> ''cas''' using shortest, longest;
     end if;
   end $near$`,
];

/** Undoes {@link DICTIONARY_TABLES}; the extension stays. */
export const DROP_DICTIONARY_TABLES: readonly string[] = ['drop function dictionary_near(text, text, int, int)', 'drop table dictionary_term', 'drop table dictionary_entry'];
