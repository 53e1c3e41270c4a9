-- The ends of the two chains. Its row is the lock under which entries and recorded_at are given, so it is
-- the one table of the audit that is updated; it proves nothing and can be rebuilt from the entries.
create table audit_chain (
    chain_name       varchar(20)                 not null primary key,
    last_sequence    bigint                      not null,
    last_hash        varchar(64)                    not null,
    last_recorded_at timestamp(6) with time zone not null
);
insert into audit_chain values
    ('acts',   0, '0000000000000000000000000000000000000000000000000000000000000000', timestamp with time zone '1970-01-01 00:00:00+00:00'),
    ('access', 0, '0000000000000000000000000000000000000000000000000000000000000000', timestamp with time zone '1970-01-01 00:00:00+00:00');
grant select, update on audit_chain to shearbook_desk;
