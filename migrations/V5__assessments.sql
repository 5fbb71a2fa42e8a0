-- Recorded assessments: what went in, what came out, and by which versions. Encrypted by the key of the case but for
-- the figures of the book. The application may add and read, nothing else.
create table assessment (
    id bigint generated always as identity primary key,
    case_id bigint not null references cases (id),
    number int not null,
    recorded_at timestamptz not null,
    recorded_by varchar(60) not null,
    engine varchar(40) not null,
    table_name varchar(120) not null,
    table_sha256 char(64) not null,
    pack_id varchar(120) not null,
    pack_version int not null,
    pack_sha256 char(64) not null,
    bands_sha256 char(64),
    input bytea not null,
    result bytea not null,
    curves bytea not null,
    mortality_ratio double precision not null,
    extra_per_mille double precision not null,
    expectation double precision not null,
    constraint assessment_number_unique unique (case_id, number),
    constraint assessment_number_counted check (number >= 1)
);

grant select, insert on assessment to nearworld_app;
