import type { Migration } from './migration.ts';

/** Fits, their results, and the feed from which they are collected. */
export const fitsAndFeed: Migration = {
  number: 4,
  name: 'fits-and-feed',
  sql: `-- compatible: new tables only
-- The id of a fit is the id of its job.
create table fit (
  laboratory_id uuid not null,
  id uuid not null,
  acquisition_id uuid not null,
  conditions_version integer not null,
  method_id text collate "C" not null,
  method_version integer not null,
  preparation_id text collate "C",
  preparation_version integer,
  options_text text not null,
  repeat_reason text,
  input_sha256 sha256_hex not null,
  seed numeric(20) not null check (seed between 0 and 18446744073709551615),
  primary key (laboratory_id, id),
  check ((preparation_id is null) = (preparation_version is null)),
  foreign key (laboratory_id, id) references job (laboratory_id, id),
  foreign key (laboratory_id, acquisition_id, conditions_version) references acquisition_conditions,
  foreign key (laboratory_id, method_id, method_version) references method (laboratory_id, id, version),
  foreign key (laboratory_id, preparation_id, preparation_version) references preparation (laboratory_id, id, version)
);
create index fit_acquisition on fit (laboratory_id, acquisition_id);
create trigger fit_is_a_fact before update on fit for each row execute function refuse_update();

create table result (
  laboratory_id uuid not null,
  fit_id uuid not null,
  -- Canonical JSON as text: jsonb would reorder keys and rewrite numbers, and the bytes are what is promised.
  result_text text not null,
  sha256 sha256_hex not null check (sha256 = encode(sha256(convert_to(result_text, 'UTF8')), 'hex')),
  engine_version text not null,
  numerics_id text not null,
  recommendation text not null check (recommendation in ('releasable', 'held')),
  created_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, fit_id),
  foreign key (laboratory_id, fit_id) references fit
);
create trigger result_is_a_fact before update on result for each row execute function refuse_update();

-- A counter row a laboratory, taken as the last lock of a transaction: sequence numbers become visible in order, without
-- gaps. A bigserial misses rows under concurrent writers; a global row is a sixth as fast.
create table feed_head (
  laboratory_id uuid primary key references laboratory,
  last_sequence bigint not null default 0
);
create table feed_event (
  laboratory_id uuid not null references laboratory,
  sequence bigint not null,
  kind text not null check (kind in ('result')),
  fit_id uuid not null,
  committed_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, sequence),
  foreign key (laboratory_id, fit_id) references result
);
create trigger feed_event_is_a_fact before update on feed_event for each row execute function refuse_update();
`,
};
