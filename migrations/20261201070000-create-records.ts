import type { QueryInterface } from 'sequelize';

/** Accounts, plans, builds and their logs. Times are with zone; lengths are integers inside the documents. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    create table accounts (
      id uuid primary key,
      email text not null unique check (email = lower(email) and length(email) between 3 and 254),
      name text not null check (length(name) between 1 and 120),
      password_hash text not null,
      role text not null default 'member' check (role in ('member', 'author', 'operator')),
      email_confirmed_at timestamptz,
      created_at timestamptz not null,
      updated_at timestamptz not null
    );

    create table sessions (
      id uuid primary key,
      account_id uuid not null references accounts on delete cascade,
      user_agent text not null check (length(user_agent) <= 400),
      last_seen_at timestamptz not null,
      expires_at timestamptz not null,
      revoked_at timestamptz,
      created_at timestamptz not null,
      updated_at timestamptz not null
    );
    create index sessions_by_account on sessions (account_id, last_seen_at desc);

    create table tokens (
      id uuid primary key,
      account_id uuid not null references accounts on delete cascade,
      purpose text not null check (purpose in ('confirm-email', 'reset-password', 'change-email')),
      token_hash text not null unique check (token_hash ~ '^[0-9a-f]{64}$'),
      email text check (email = lower(email)),
      expires_at timestamptz not null,
      used_at timestamptz,
      created_at timestamptz not null,
      updated_at timestamptz not null,
      check ((purpose = 'change-email') = (email is not null))
    );
    create index tokens_by_account on tokens (account_id, purpose);

    create table throttles (
      key text primary key check (length(key) <= 300),
      count integer not null check (count >= 0),
      window_ends_at timestamptz not null
    );
    create index throttles_by_end on throttles (window_ends_at);

    create table files (
      id uuid primary key,
      sha256 text not null unique check (sha256 ~ '^[0-9a-f]{64}$'),
      bytes integer not null check (bytes > 0),
      media_type text not null,
      width integer check (width > 0),
      height integer check (height > 0),
      storage text not null check (storage in ('database', 'bucket')),
      created_at timestamptz not null,
      updated_at timestamptz not null
    );
    create table file_bytes (
      file_id uuid primary key references files on delete cascade,
      content bytea not null
    );
    alter table file_bytes alter column content set storage external;

    create table plans (
      id uuid primary key,
      owner_account_id uuid not null references accounts on delete restrict,
      plan_key text not null check (plan_key ~ '^[a-z0-9][a-z0-9-]{0,59}$'),
      title text not null check (length(title) between 1 and 120),
      visibility text not null default 'private' check (visibility in ('private', 'public')),
      current_revision_id uuid,
      created_at timestamptz not null,
      updated_at timestamptz not null,
      unique (owner_account_id, plan_key)
    );
    create index plans_public on plans (title) where visibility = 'public';

    create table plan_revisions (
      id uuid primary key,
      plan_id uuid not null references plans on delete restrict,
      number integer not null check (number >= 1),
      content_hash text not null check (content_hash ~ '^[0-9a-f]{64}$'),
      document jsonb not null check (document ->> 'format' = 'holdfast-plan'),
      created_at timestamptz not null,
      updated_at timestamptz not null,
      unique (plan_id, number),
      unique (plan_id, content_hash)
    );
    create index plan_revisions_by_hash on plan_revisions (content_hash);
    alter table plans add foreign key (current_revision_id) references plan_revisions on delete restrict;

    create table plan_files (
      revision_id uuid not null references plan_revisions on delete cascade,
      attachment_id text not null,
      file_id uuid not null references files on delete restrict,
      primary key (revision_id, attachment_id)
    );
    create index plan_files_by_file on plan_files (file_id);

    create table builds (
      id uuid primary key,
      name text not null check (length(name) between 1 and 120),
      plan_revision_id uuid not null references plan_revisions on delete restrict,
      created_by uuid not null references accounts on delete restrict,
      started_at timestamptz not null,
      closed_at timestamptz,
      last_position integer not null default 0 check (last_position >= 0),
      created_at timestamptz not null,
      updated_at timestamptz not null
    );
    create index builds_by_revision on builds (plan_revision_id);
    create index builds_by_creator on builds (created_by);

    create table crew_members (
      build_id uuid not null references builds on delete cascade,
      account_id uuid not null references accounts on delete restrict,
      role text not null check (role in ('owner', 'helper', 'onlooker')),
      joined_at timestamptz not null,
      removed_at timestamptz,
      primary key (build_id, account_id)
    );
    create index crew_members_by_account on crew_members (account_id) where removed_at is null;
    create unique index one_owner_for_each_build on crew_members (build_id) where role = 'owner' and removed_at is null;

    create table log_entries (
      id uuid primary key,
      build_id uuid not null references builds on delete cascade,
      position integer not null check (position >= 1),
      stamp bigint not null,
      account_id uuid not null references accounts on delete restrict,
      device_id uuid not null,
      made_at bigint not null,
      seen integer not null check (seen >= 0),
      kind text not null check (length(kind) <= 60),
      v integer not null check (v >= 1),
      target jsonb not null,
      value jsonb not null,
      content_hash text not null check (content_hash ~ '^[0-9a-f]{64}$'),
      received_at timestamptz not null,
      unique (build_id, position)
    );
    create index log_entries_by_device on log_entries (build_id, device_id, position desc);
    create index log_entries_by_account on log_entries (account_id);

    create table snapshots (
      build_id uuid primary key references builds on delete cascade,
      position integer not null check (position >= 0),
      state jsonb not null
    );

    create table photos (
      id uuid primary key,
      build_id uuid not null references builds on delete cascade,
      sha256 text not null check (sha256 ~ '^[0-9a-f]{64}$'),
      file_id uuid not null references files on delete restrict,
      account_id uuid not null references accounts on delete restrict,
      created_at timestamptz not null,
      updated_at timestamptz not null,
      unique (build_id, sha256)
    );
    create index photos_by_file on photos (file_id);
    create index photos_by_account on photos (account_id);

    create table server_epochs (
      id integer primary key check (id = 1),
      epoch uuid not null
    );
    insert into server_epochs (id, epoch) values (1, gen_random_uuid());

    create function refuse_change() returns trigger language plpgsql as $$
    begin
      raise exception '% is written once and never changed', tg_table_name using errcode = 'integrity_constraint_violation';
    end $$;
    create trigger plan_revisions_never_change before update on plan_revisions for each row execute function refuse_change();
    create trigger log_entries_never_change before update on log_entries for each row execute function refuse_change();
  `);
}
