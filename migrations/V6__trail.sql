-- One chain of entries. An entry is canonical JSON (RFC 8785) and names the checksum of the one before it; what is
-- personal is sealed beside it, and the entry names the checksum of the ciphertext. The columns for searching are
-- derived from the entry by the database, so they cannot disagree with it.
create table trail (
    seq bigint primary key,
    entry text not null,
    sealed bytea,
    sha256 char(64) not null,
    action varchar(40) generated always as (entry::jsonb ->> 'action') stored,
    case_ref varchar(40) generated always as (entry::jsonb ->> 'caseRef') stored,
    constraint trail_seq_counted check (seq >= 1)
);

create index trail_by_case on trail (case_ref, seq) where case_ref is not null;

grant select, insert on trail to nearworld_app;
