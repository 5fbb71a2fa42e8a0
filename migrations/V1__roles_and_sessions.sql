-- Two roles from the first day. The owner runs these migrations and owns every table. The application signs in as
-- nearworld_app, or as a member of it, and has only the rights that each migration grants to nearworld_app by name.

do $$
begin
    if not exists (select from pg_roles where rolname = 'nearworld_app') then
        begin
            create role nearworld_app nologin;
        exception when insufficient_privilege then
            raise exception 'the role nearworld_app is missing, and % may not create it', current_user
                using hint = 'As a superuser: create role nearworld_app login password ''...'';';
        end;
    end if;
    if exists (select from pg_roles where rolname = 'nearworld_app'
               and (rolsuper or rolcreaterole or rolcreatedb or rolbypassrls or rolreplication)) then
        raise exception 'the role nearworld_app must have no rights over the whole server'
            using hint = 'alter role nearworld_app nosuperuser nocreaterole nocreatedb nobypassrls noreplication;';
    end if;
    -- What PostgreSQL grants to everybody is taken back: the right to connect and to make temporary tables.
    execute format('revoke all on database %I from public', current_database());
    execute format('grant connect on database %I to nearworld_app', current_database());
end
$$;

revoke all on schema public from public;
grant usage on schema public to nearworld_app;

-- Nothing is granted unasked, neither to nearworld_app nor to everybody: each migration says what it grants.
alter default privileges revoke execute on functions from public;

-- Spring Session's own tables (spring-session-jdbc 4.0, schema-postgresql.sql).
create table spring_session (
    primary_id char(36) not null,
    session_id char(36) not null,
    creation_time bigint not null,
    last_access_time bigint not null,
    max_inactive_interval int not null,
    expiry_time bigint not null,
    principal_name varchar(100),
    constraint spring_session_pk primary key (primary_id)
);

create unique index spring_session_ix1 on spring_session (session_id);
create index spring_session_ix2 on spring_session (expiry_time);
create index spring_session_ix3 on spring_session (principal_name);

create table spring_session_attributes (
    session_primary_id char(36) not null,
    attribute_name varchar(200) not null,
    attribute_bytes bytea not null,
    constraint spring_session_attributes_pk primary key (session_primary_id, attribute_name),
    constraint spring_session_attributes_fk foreign key (session_primary_id)
        references spring_session (primary_id) on delete cascade
);

grant select, insert, update, delete on spring_session, spring_session_attributes to nearworld_app;
