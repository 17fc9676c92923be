import type { Migration } from './migration.ts';

/** Work to be done, who does it, and the one table of allowed changes of state. */
export const jobs: Migration = {
  number: 3,
  name: 'jobs',
  sql: `-- compatible: new tables only
create table worker (
  id uuid primary key default gen_random_uuid(),
  -- Key of the session advisory lock that this worker holds for as long as it lives.
  advisory_key integer generated always as identity unique,
  label text not null,
  wanted_concurrency integer not null check (wanted_concurrency >= 0),
  actual_concurrency integer not null default 0 check (actual_concurrency >= 0),
  started_at timestamptz not null default clock_timestamp(),
  heartbeat_at timestamptz not null default clock_timestamp(),
  ended_at timestamptz
);

create table job (
  id uuid primary key default gen_random_uuid(),
  laboratory_id uuid not null references laboratory,
  kind text collate "C" not null check (kind in ('fit')),
  state text collate "C" not null default 'queued'
    check (state in ('queued', 'running', 'completed', 'failed', 'cancelled')),
  -- Times it was taken up; with the id it is the fence of whoever works on it.
  attempt integer not null default 0 check (attempt >= 0),
  -- Attempts given back in good order; they do not count against max_attempts.
  forgiven_count integer not null default 0 check (forgiven_count between 0 and attempt),
  max_attempts integer not null check (max_attempts >= 1),
  natural_key sha256_hex not null,
  created_at timestamptz not null default clock_timestamp(),
  not_before timestamptz not null default clock_timestamp(),
  dispatched_at timestamptz,
  worker_id uuid references worker,
  lease_until timestamptz,
  stage text,
  fraction double precision check (fraction between 0 and 1),
  cancel_requested boolean not null default false,
  problem text,
  finished_at timestamptz,
  revision integer not null default 1,
  unique (laboratory_id, id),
  check ((state = 'running') = (worker_id is not null)),
  check ((state = 'running') = (lease_until is not null)),
  check ((state = 'failed') = (problem is not null)),
  check ((state in ('completed', 'failed', 'cancelled')) = (finished_at is not null))
);
-- Asking twice is asking once; failed and cancelled jobs free their place.
create unique index job_natural_key on job (laboratory_id, kind, natural_key) where state not in ('failed', 'cancelled');
create index job_queued on job (not_before, id) where state = 'queued';
create index job_running on job (worker_id) where state = 'running';

create table job_transition (
  from_state text collate "C" not null,
  to_state text collate "C" not null,
  primary key (from_state, to_state)
);
insert into job_transition values
  ('queued', 'running'), ('running', 'queued'),
  ('running', 'completed'), ('running', 'failed'),
  ('queued', 'cancelled'), ('running', 'cancelled');

create function job_keeps_the_state_table() returns trigger language plpgsql as $$
begin
  if tg_op = 'INSERT' then
    if new.state <> 'queued' or new.attempt <> 0 then
      raise exception 'a job starts queued with attempt 0, not % with attempt %', new.state, new.attempt
        using errcode = 'check_violation', constraint = 'job_starts_queued';
    end if;
    return new;
  end if;
  if old.state in ('completed', 'failed', 'cancelled') then
    raise exception 'job % is %: it never changes again', old.id, old.state
      using errcode = 'check_violation', constraint = 'job_final_states';
  end if;
  if new.state <> old.state and not exists (
    select from job_transition where from_state = old.state and to_state = new.state
  ) then
    raise exception 'a job cannot go from % to %', old.state, new.state
      using errcode = 'check_violation', constraint = 'job_transition';
  end if;
  if new.attempt <> old.attempt + (old.state = 'queued' and new.state = 'running')::integer then
    raise exception 'the attempt of a job rises by one when it is taken up, and only then'
      using errcode = 'check_violation', constraint = 'job_attempt_count';
  end if;
  if (new.state, new.stage, new.fraction, new.cancel_requested, new.problem)
    is distinct from (old.state, old.stage, old.fraction, old.cancel_requested, old.problem) then
    new.revision := old.revision + 1;
  end if;
  return new;
end $$;
create trigger job_keeps_the_state_table before insert or update on job
  for each row execute function job_keeps_the_state_table();

-- When and by whom each attempt was made; timings live here, never in a result.
create table job_attempt (
  laboratory_id uuid not null,
  job_id uuid not null,
  attempt integer not null check (attempt >= 1),
  worker_id uuid not null references worker,
  claimed_at timestamptz not null default clock_timestamp(),
  ended_at timestamptz,
  outcome text check (outcome in ('completed', 'failed', 'cancelled', 'handed-back', 'lost')),
  timings text,
  primary key (laboratory_id, job_id, attempt),
  foreign key (laboratory_id, job_id) references job (laboratory_id, id),
  check ((ended_at is null) = (outcome is null))
);
`,
};
