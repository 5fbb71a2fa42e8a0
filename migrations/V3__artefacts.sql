-- Tables, packs and bands. A draft becomes published; from then on nothing of it changes.
create table artefact (
    id bigint generated always as identity primary key,
    kind varchar(10) not null,
    name varchar(120) not null,
    version int not null,
    title varchar(300) not null,
    state varchar(12) not null,
    sha256 char(64) not null,
    content text not null,
    created_at timestamptz not null,
    published_at timestamptz,
    constraint artefact_kind_known check (kind in ('table', 'pack', 'bands')),
    constraint artefact_state_known check (state in ('draft', 'published')),
    constraint artefact_version_counted check (version >= 1),
    constraint artefact_unique unique (kind, name, version),
    constraint artefact_sha256_hex check (sha256 ~ '^[0-9a-f]{64}$'),
    constraint artefact_published_dated check ((state = 'published') = (published_at is not null))
);

create index artefact_by_sha256 on artefact (sha256);

create function artefact_keep_published() returns trigger language plpgsql as $$
begin
    if old.state = 'published' then
        raise exception 'artefact % is published and never changes', old.id using errcode = 'restrict_violation';
    end if;
    if tg_op = 'DELETE' then
        return old;
    end if;
    return new;
end
$$;

create trigger artefact_keep_published before update or delete on artefact
    for each row execute function artefact_keep_published();

-- Which table and which pack new calculations take, by kind of cover and from which day on.
create table artefact_default (
    kind varchar(10) not null,
    cover_kind varchar(20) not null,
    from_day date not null,
    artefact_id bigint not null references artefact (id),
    constraint artefact_default_pk primary key (kind, cover_kind, from_day),
    constraint artefact_default_cover_known
        check (cover_kind in ('term', 'wholeOfLife', 'endowment', 'lifeAnnuity'))
);

grant select, insert on artefact to nearworld_app;
grant update (state, published_at) on artefact to nearworld_app;
grant select, insert on artefact_default to nearworld_app;
