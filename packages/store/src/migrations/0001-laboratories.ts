import type { Migration } from './migration.ts';

/** Laboratories, their access keys, their bytes, and what was done by whom. */
export const laboratories: Migration = {
  number: 1,
  name: 'laboratories',
  sql: `-- compatible: the first tables, nothing reads them yet
create domain sha256_hex as text collate "C" check (value ~ '^[0-9a-f]{64}$');

-- For rows that are facts: what was measured, written or decided is never changed, only followed by a newer row.
create function refuse_update() returns trigger language plpgsql as $$
begin
  raise exception 'rows of % never change', tg_table_name using errcode = 'restrict_violation';
end $$;

create table laboratory (
  id uuid primary key default gen_random_uuid(),
  name text not null unique check (char_length(name) between 1 and 200),
  created_at timestamptz not null default clock_timestamp()
);

create table access_key (
  id text collate "C" primary key check (id ~ '^[0-9a-z]{12}$'),
  laboratory_id uuid not null references laboratory,
  secret_sha256 bytea not null check (octet_length(secret_sha256) = 32),
  roles text[] not null check (
    cardinality(roles) > 0
    and roles <@ array['pipeline', 'analyst', 'lims', 'method-owner', 'admin', 'auditor']
  ),
  label text not null check (char_length(label) between 1 and 200),
  created_at timestamptz not null default clock_timestamp(),
  expires_at timestamptz,
  revoked_at timestamptz,
  last_used_at timestamptz
);
create index access_key_laboratory on access_key (laboratory_id);

-- Bytes addressed by their digest, in chunks: one large bytea stalls the reader's event loop and is detoasted whole.
create table blob (
  laboratory_id uuid not null references laboratory,
  sha256 sha256_hex not null,
  byte_count integer not null check (byte_count >= 0),
  created_at timestamptz not null default clock_timestamp(),
  primary key (laboratory_id, sha256)
);
create table blob_chunk (
  laboratory_id uuid not null,
  sha256 sha256_hex not null,
  chunk_index integer not null check (chunk_index >= 0),
  bytes bytea not null check (octet_length(bytes) between 1 and 262144),
  primary key (laboratory_id, sha256, chunk_index),
  foreign key (laboratory_id, sha256) references blob on delete cascade
);
-- A FID does not compress; EXTERNAL saves the attempt.
alter table blob_chunk alter column bytes set storage external;
create trigger blob_is_a_fact before update on blob for each row execute function refuse_update();
create trigger blob_chunk_is_a_fact before update on blob_chunk for each row execute function refuse_update();

create table audit (
  id bigint generated always as identity primary key,
  laboratory_id uuid references laboratory,
  recorded_at timestamptz not null default clock_timestamp(),
  action text not null,
  subject text not null,
  detail text not null default '{}'
);
create index audit_laboratory on audit (laboratory_id, id);
create trigger audit_is_a_fact before update on audit for each row execute function refuse_update();
`,
};
