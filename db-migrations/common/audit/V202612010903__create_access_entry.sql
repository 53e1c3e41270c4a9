-- Sign-ins and reads are kept for a year only, so they form a chain of their own, closed by month.
create table access_entry (
    entry_sequence    bigint                      not null primary key,
    chain_month       varchar(7)                     not null,
    recorded_at       timestamp(6) with time zone not null,
    actor             varchar(100)                not null,
    actor_role        varchar(100)                not null,
    address           varchar(100)                not null,
    session_reference varchar(100)                not null,
    act               varchar(60)                 not null,
    subject           varchar(200)                not null,
    previous_hash     varchar(64)                    not null,
    entry_hash        varchar(64)                    not null
);
create index access_entry_month on access_entry (chain_month, entry_sequence);
grant select, insert on access_entry to shearbook_desk;
