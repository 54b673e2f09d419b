-- Search rows follow their revision and their source inside the same transaction, whoever changes those; the application itself may only add
-- rows, and take away those of an older maker to make them anew. The functions run as their owner, since the application may not update the table.

-- Text without accents and case, its spaces single.
create function folded(words text) returns text language sql stable parallel safe set search_path = public, pg_temp as $$
  select btrim(regexp_replace(lower(unaccent(words)), '\s+', ' ', 'g'))
$$;--> statement-breakpoint

-- What a source adds to the words of its rows: without the marks that titles carry.
create function source_words(s sources) returns text language sql stable set search_path = public, pg_temp as $$
  select lower(regexp_replace(
    concat_ws(' ', s.title, s.authors, s.container, s.year::text, s.doi), '</?(i|b|sub|sup|em|strong|italic|bold|span|sc|scp|inf)(\s[^<>]{0,200})?/?>', '', 'gi'
  ))
$$;--> statement-breakpoint

-- Family names of a source's authors, with and without what stands before them, and the names of groups.
create function source_author_keys(s sources) returns text[] language sql stable set search_path = public, pg_temp as $$
  select coalesce(array_agg(distinct k), '{}')
  from jsonb_array_elements(case jsonb_typeof(s.csl -> 'author') when 'array' then s.csl -> 'author' else '[]' end) a,
    unnest(array[folded(a ->> 'family'), folded(concat_ws(' ', a ->> 'non-dropping-particle', a ->> 'family')), folded(a ->> 'literal')]) k
  where k <> ''
$$;--> statement-breakpoint

create function fill_search_row() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
declare r revisions; s sources;
begin
  select * into strict r from revisions where id = new.revision_id;
  select * into strict s from sources where id = r.source_id;
  new.state := r.state;
  new.author_id := r.author_id;
  new.contributor_key := folded(r.author_name);
  new.accepted_at := r.accepted_at;
  new.source_id := s.id;
  new.source_label := s.label;
  new.author_keys := source_author_keys(s);
  new.doi := s.doi;
  new.year := s.year;
  new.search_text := split_part(new.search_text, E'\x1f', 1) || E'\x1f' || source_words(s);
  new.document := to_tsvector('simple', unaccent(new.search_text));
  return new;
end $$;--> statement-breakpoint
create trigger fill_search_row before insert on search_rows for each row execute function fill_search_row();--> statement-breakpoint

-- Rows change only as their revision or source does: inside the triggers below, never by a statement of anybody's own.
create or replace function guard_search_row() returns trigger language plpgsql as $$
begin
  if pg_trigger_depth() < 2 then
    raise exception 'search rows follow what they are made of' using errcode = 'restrict_violation', constraint = 'rows_are_permanent';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_search_row before update on search_rows for each row execute function guard_search_row();--> statement-breakpoint

create function search_row_follows_revision() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
begin
  update search_rows set state = new.state, contributor_key = folded(new.author_name), accepted_at = new.accepted_at where revision_id = new.id;
  return null;
end $$;--> statement-breakpoint
create trigger search_row_follows_revision after update of state, author_name, accepted_at on revisions for each row
  when ((old.state, old.author_name, old.accepted_at) is distinct from (new.state, new.author_name, new.accepted_at))
  execute function search_row_follows_revision();--> statement-breakpoint

create function search_rows_follow_source() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
declare words text := source_words(new); keys text[] := source_author_keys(new);
begin
  update search_rows set source_label = new.label, author_keys = keys, doi = new.doi, year = new.year,
    search_text = split_part(search_text, E'\x1f', 1) || E'\x1f' || words,
    document = to_tsvector('simple', unaccent(split_part(search_text, E'\x1f', 1) || E'\x1f' || words))
  where source_id = new.id;
  return null;
end $$;--> statement-breakpoint
create trigger search_rows_follow_source after update on sources for each row
  when ((old.label, old.title, old.authors, old.container, old.year, old.doi, old.csl) is distinct from (new.label, new.title, new.authors, new.container, new.year, new.doi, new.csl))
  execute function search_rows_follow_source();--> statement-breakpoint

-- Words become known when a row is listed, in the order of the alphabet, so that two transactions never wait for each other in a ring.
create function words_in(words text) returns setof text language sql stable set search_path = public, pg_temp as $$
  select word from regexp_split_to_table(lower(unaccent(words)), '[^a-z]+') word where length(word) between 4 and 40
$$;--> statement-breakpoint

create function note_new_words() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
begin
  insert into search_words (word) select distinct word from new_rows n, words_in(n.search_text) word where n.listed order by word on conflict do nothing;
  return null;
end $$;--> statement-breakpoint
create trigger note_new_words after insert on search_rows referencing new table as new_rows for each statement execute function note_new_words();--> statement-breakpoint

create function note_changed_words() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
begin
  insert into search_words (word) select distinct word from new_rows n join old_rows o using (revision_id), words_in(n.search_text) word
  where n.listed and (not o.listed or n.search_text is distinct from o.search_text) order by word on conflict do nothing;
  return null;
end $$;--> statement-breakpoint
create trigger note_changed_words after update on search_rows referencing new table as new_rows old table as old_rows for each statement execute function note_changed_words();--> statement-breakpoint

-- Takes away rows of an older maker, some at a time; whoever asks makes them anew in the same transaction.
create function take_old_search_rows(maker integer, most integer) returns setof uuid language sql security definer set search_path = public, pg_temp as $$
  delete from search_rows where revision_id in (select revision_id from search_rows where made_by < maker order by revision_id limit most for update skip locked) returning revision_id
$$;
