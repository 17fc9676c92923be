import type { Migration } from './migration.ts';

/** What a laboratory brings: signals with their conditions, and versioned compounds, methods and preparations. */
export const acquisitionsAndDocuments: Migration = {
  number: 2,
  name: 'acquisitions-and-documents',
  sql: `-- compatible: new tables only
-- Every key carries the laboratory, so that no foreign key can reach across.
create table acquisition (
  laboratory_id uuid not null references laboratory,
  id uuid not null default gen_random_uuid(),
  signal_sha256 sha256_hex not null,
  sample_count integer not null check (sample_count > 0),
  dwell_seconds double precision not null check (dwell_seconds > 0),
  observe_frequency_mhz double precision not null check (observe_frequency_mhz > 0),
  nucleus text not null check (nucleus = '1H'),
  title text,
  original_media_type text not null,
  original_blob_sha256 sha256_hex not null,
  signal_blob_sha256 sha256_hex not null,
  received_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, id),
  unique (laboratory_id, signal_sha256),
  -- Deferred: the row goes in first and tells whether the bytes are needed at all.
  foreign key (laboratory_id, original_blob_sha256) references blob deferrable initially deferred,
  foreign key (laboratory_id, signal_blob_sha256) references blob deferrable initially deferred
);
create trigger acquisition_is_a_fact before update on acquisition for each row execute function refuse_update();

create table acquisition_conditions (
  laboratory_id uuid not null,
  acquisition_id uuid not null,
  version integer not null check (version >= 1),
  effective_text text not null,
  declared_text text not null,
  file_text text not null,
  sha256 sha256_hex not null check (sha256 = encode(sha256(convert_to(effective_text, 'UTF8')), 'hex')),
  created_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, acquisition_id, version),
  foreign key (laboratory_id, acquisition_id) references acquisition
);
create trigger acquisition_conditions_are_facts before update on acquisition_conditions
  for each row execute function refuse_update();

-- One shape, three tables: a fit refers to the partition, so a compound can never stand where a method belongs.
create table document (
  laboratory_id uuid not null references laboratory,
  kind text collate "C" not null,
  id text collate "C" not null check (id ~ '^[a-z0-9]+(-[a-z0-9]+)*$' and octet_length(id) <= 80),
  version integer not null check (version >= 1),
  name text not null,
  body_text text not null,
  sha256 sha256_hex not null check (sha256 = encode(sha256(convert_to(body_text, 'UTF8')), 'hex')),
  created_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, kind, id, version)
) partition by list (kind);
create table compound partition of document for values in ('compound');
create table method partition of document for values in ('method');
create table preparation partition of document for values in ('preparation');
alter table method add constraint method_version unique (laboratory_id, id, version);
alter table preparation add constraint preparation_version unique (laboratory_id, id, version);
create trigger document_is_a_fact before update on document for each row execute function refuse_update();
`,
};
