-- A key for each case, wrapped by the master key, which lies outside the database.
create table data_key (
    id uuid primary key,
    wrapped bytea not null,
    created_at timestamptz not null
);

grant select, insert on data_key to nearworld_app;

-- A case: one life, one cover. What is personal is encrypted by the key of the case.
create table cases (
    id bigint generated always as identity primary key,
    ref varchar(40) not null,
    state varchar(12) not null,
    owner_id bigint not null references person (id),
    assignee_id bigint references person (id),
    referred_to_id bigint references person (id),
    key_id uuid not null,
    external_ref bytea,
    external_ref_index bytea,
    cover_kind varchar(20),
    mortality_ratio double precision,
    due_on date,
    created_on date not null,
    created_at timestamptz not null,
    updated_at timestamptz not null,
    constraint cases_ref_unique unique (ref),
    constraint cases_ref_pattern check (ref ~ '^[A-Za-z0-9][A-Za-z0-9._-]*$'),
    constraint cases_state_known check (state in ('open', 'assessed', 'referred', 'decided', 'closed')),
    constraint cases_cover_known check (cover_kind in ('term', 'wholeOfLife', 'endowment', 'lifeAnnuity'))
);

create index cases_by_owner on cases (owner_id);
create index cases_by_assignee on cases (assignee_id);
create index cases_by_referred_to on cases (referred_to_id) where referred_to_id is not null;
create index cases_by_updated on cases (updated_at);
create index cases_by_external_ref on cases (external_ref_index) where external_ref_index is not null;

create sequence case_number start with 1001;

-- The five sections, each stored as typed and as its valid part of case/1, both encrypted.
create table case_section (
    case_id bigint not null references cases (id),
    section varchar(12) not null,
    version bigint not null,
    typed bytea not null,
    valid bytea not null,
    saved_at timestamptz not null,
    saved_by varchar(60) not null,
    constraint case_section_pk primary key (case_id, section),
    constraint case_section_known check (section in ('person', 'statements', 'history', 'whatIfs', 'cover')),
    constraint case_section_version_counted check (version >= 0)
);

grant select, insert on cases to nearworld_app;
grant update (state, owner_id, assignee_id, referred_to_id, external_ref, external_ref_index, cover_kind, mortality_ratio,
    due_on, updated_at) on cases to nearworld_app;
grant usage on sequence case_number to nearworld_app;
grant select, insert on case_section to nearworld_app;
grant update (version, typed, valid, saved_at, saved_by) on case_section to nearworld_app;
