-- What must hold whatever a program does: the state machine, frozen revisions, rows that are only ever added, the chained log,
-- and the rule of two people. The service checks the same and answers better; the database has the last word.

create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation', constraint = 'rows_are_permanent';
end $$;--> statement-breakpoint

create function state_allows(old_state text, new_state text) returns boolean language sql immutable as $$
  select (old_state, new_state) in (
    ('draft', 'submitted'), ('draft', 'withdrawn'),
    ('submitted', 'under-review'), ('submitted', 'accepted'), ('submitted', 'returned'), ('submitted', 'rejected'), ('submitted', 'withdrawn'),
    ('under-review', 'submitted'), ('under-review', 'accepted'), ('under-review', 'returned'), ('under-review', 'rejected'), ('under-review', 'withdrawn'),
    ('returned', 'withdrawn'),
    ('accepted', 'superseded'), ('accepted', 'retracted')
  )
$$;--> statement-breakpoint

create function guard_revision() returns trigger language plpgsql as $$
begin
  if tg_op = 'INSERT' then
    if new.state <> 'draft' or new.version is not null then
      raise exception 'a revision begins as a draft' using errcode = 'check_violation', constraint = 'revisions_begin_as_draft';
    end if;
    return new;
  end if;
  if tg_op = 'DELETE' then
    raise exception 'revisions are never deleted' using errcode = 'restrict_violation', constraint = 'rows_are_permanent';
  end if;
  if (new.id, new.entry_id, new.number, new.author_id, new.created_at) is distinct from (old.id, old.entry_id, old.number, old.author_id, old.created_at) then
    raise exception 'what identifies a revision never changes' using errcode = 'restrict_violation', constraint = 'revisions_are_frozen';
  end if;
  if new.state is distinct from old.state and not state_allows(old.state, new.state) then
    raise exception 'a revision cannot go from % to %', old.state, new.state using errcode = 'check_violation', constraint = 'revisions_transition';
  end if;
  if old.state <> 'draft' and (
    new.input, new.input_hash, new.author_name, new.kind, new.scope, new.provenance, new.step_id, new.surface_id, new.source_id,
    new.method_class, new.technique, new.valid_min_k, new.valid_max_k, new.revise_reason
  ) is distinct from (
    old.input, old.input_hash, old.author_name, old.kind, old.scope, old.provenance, old.step_id, old.surface_id, old.source_id,
    old.method_class, old.technique, old.valid_min_k, old.valid_max_k, old.revise_reason
  ) then
    raise exception 'a submitted revision is frozen' using errcode = 'restrict_violation', constraint = 'revisions_are_frozen';
  end if;
  if old.version is not null and new.version is distinct from old.version then
    raise exception 'a version number never changes' using errcode = 'restrict_violation', constraint = 'revisions_are_frozen';
  end if;
  if old.accepted_at is not null and new.accepted_at is distinct from old.accepted_at then
    raise exception 'the time of acceptance never changes' using errcode = 'restrict_violation', constraint = 'revisions_are_frozen';
  end if;
  if new.state = 'accepted' and old.state <> 'accepted' and not exists (
    select 1 from decisions d join submissions s on s.id = d.submission_id where s.revision_id = new.id and d.decision = 'accept'
  ) then
    raise exception 'a revision is accepted by a decision only' using errcode = 'check_violation', constraint = 'revisions_accepted_by_decision';
  end if;
  if new.lock <= old.lock then
    raise exception 'every change raises the lock' using errcode = 'check_violation', constraint = 'revisions_lock_rises';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_revision before insert or update or delete on revisions for each row execute function guard_revision();--> statement-breakpoint

create function guard_quantity() returns trigger language plpgsql as $$
begin
  if (select state from revisions where id = new.revision_id) <> 'draft' then
    raise exception 'the quantities of a submitted revision are frozen' using errcode = 'restrict_violation', constraint = 'revisions_are_frozen';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_quantity before insert on quantities for each row execute function guard_quantity();--> statement-breakpoint

create function guard_decision() returns trigger language plpgsql as $$
declare holder uuid; until timestamptz;
begin
  if exists (
    select 1 from submissions s join revisions r on r.id = s.revision_id join entries e on e.id = s.entry_id
    where s.id = new.submission_id and new.decided_by in (r.author_id, e.contributor_id, s.submitted_by)
  ) then
    raise exception 'nobody decides on their own submission' using errcode = 'check_violation', constraint = 'decisions_not_on_own';
  end if;
  if not exists (select 1 from user_roles u where u.user_id = new.decided_by and u.role in ('reviewer', 'curator')) then
    raise exception 'only reviewers decide' using errcode = 'check_violation', constraint = 'decisions_by_reviewers';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_decision before insert on decisions for each row execute function guard_decision();--> statement-breakpoint

create function guard_submission() returns trigger language plpgsql as $$
begin
  if (new.id, new.entry_id, new.revision_id, new.round, new.previous_id, new.submitted_by, new.submitted_at)
    is distinct from (old.id, old.entry_id, old.revision_id, old.round, old.previous_id, old.submitted_by, old.submitted_at) then
    raise exception 'what was handed in never changes' using errcode = 'restrict_violation', constraint = 'rows_are_permanent';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_submission before update on submissions for each row execute function guard_submission();--> statement-breakpoint

create function guard_search_row() returns trigger language plpgsql as $$
begin
  if (to_jsonb(new) - 'listed') is distinct from (to_jsonb(old) - 'listed') then
    raise exception 'search rows are made once' using errcode = 'restrict_violation', constraint = 'rows_are_permanent';
  end if;
  return new;
end $$;--> statement-breakpoint
create trigger guard_search_row before update on search_rows for each row execute function guard_search_row();--> statement-breakpoint

-- The canonical text a log row's hash is taken over. Everything in it is opaque: ids, codes, hashes.
create function event_hash(e events) returns bytea language sql stable as $$
  select sha256(convert_to(concat_ws('|',
    e.seq::text, to_char(e.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US'), to_char(e.recorded_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US'),
    coalesce(e.actor_id::text, '-'), e.action, e.subject_type, e.subject_id::text, e.payload::text, encode(e.previous_hash, 'hex')
  ), 'UTF8'))
$$;--> statement-breakpoint

create function chain_event() returns trigger language plpgsql as $$
declare last_seq bigint; last_hash bytea;
begin
  -- One writer at a time, held to the end of the transaction: the numbers follow the order of commit and have no gaps.
  perform pg_advisory_xact_lock(715517);
  select seq, hash into last_seq, last_hash from events order by seq desc limit 1;
  new.seq := coalesce(last_seq, 0) + 1;
  new.recorded_at := clock_timestamp();
  if new.at > new.recorded_at + interval '1 minute' then
    raise exception 'an event cannot lie in the future' using errcode = 'check_violation', constraint = 'events_not_in_future';
  end if;
  new.previous_hash := coalesce(last_hash, decode(repeat('00', 32), 'hex'));
  new.hash := event_hash(new);
  return new;
end $$;--> statement-breakpoint
create trigger chain_event before insert on events for each row execute function chain_event();--> statement-breakpoint

-- The first row whose number, link or hash is not what it should be; none when the chain holds.
create function broken_event() returns table (seq bigint, fault text) language sql stable as $$
  select e.seq,
    case when e.seq <> e.expected_seq then 'number' when e.previous_hash <> e.expected_previous then 'link' else 'hash' end
  from (
    select events.*, row_number() over (order by events.seq) as expected_seq,
      coalesce(lag(events.hash) over (order by events.seq), decode(repeat('00', 32), 'hex')) as expected_previous,
      event_hash(events) as expected_hash
    from events
  ) e
  where e.seq <> e.expected_seq or e.previous_hash <> e.expected_previous or e.hash <> e.expected_hash
  order by e.seq limit 1
$$;--> statement-breakpoint

create trigger permanent before update or delete on events for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent_table before truncate on events for each statement execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on quantities for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on conversions for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on converted_quantities for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on raised_checks for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on accepted_conversions for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on decisions for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before delete on submissions for each row execute function refuse_change();--> statement-breakpoint
create trigger permanent before update or delete on entries for each row execute function refuse_change();
