-- What must be forgotten: the bytes as received, their salt, and the fingerprints that find them again. Disposed of together.
create table intake_raw (
    batch_id       bigint  not null,
    arrival_number integer not null,
    salt           bytea   not null,
    bytes          bytea   not null,
    constraint intake_raw_once primary key (batch_id, arrival_number)
);
grant select, insert, delete on intake_raw to shearbook_desk;

create table intake_fingerprint (
    fingerprint    varchar(64) not null primary key,
    record_kind    varchar(20) not null,
    record_id      bigint      not null,
    record_version integer     not null,
    batch_id       bigint      not null
);
create index intake_fingerprint_batch on intake_fingerprint (batch_id);
grant select, insert, delete on intake_fingerprint to shearbook_desk;
