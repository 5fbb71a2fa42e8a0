-- Those who sign in. The application may change a person but never remove one: the trail names them.
create table person (
    id bigint generated always as identity primary key,
    name varchar(60) not null,
    display_name varchar(120) not null,
    role varchar(20) not null,
    password_hash varchar(200) not null,
    enabled boolean not null default true,
    failed_attempts int not null default 0,
    locked_until timestamptz,
    created_at timestamptz not null,
    constraint person_name_unique unique (name),
    constraint person_name_lower check (name = lower(name) and name ~ '^[a-z0-9][a-z0-9._@-]*$'),
    constraint person_role_known check (role in ('underwriter', 'medicalOfficer', 'manager', 'admin', 'auditor')),
    constraint person_attempts_counted check (failed_attempts >= 0)
);

grant select, insert on person to nearworld_app;
grant update (display_name, role, password_hash, enabled, failed_attempts, locked_until) on person to nearworld_app;
