-- The chain of acts: who did what to which version, each entry bound to the one before it.
create table audit_entry (
    entry_sequence      bigint                      not null primary key,
    recorded_at         timestamp(6) with time zone not null,
    actor               varchar(100)                not null,
    actor_role          varchar(100)                not null,
    holds_desk          boolean                     not null,
    workstation         varchar(100)                not null,
    address             varchar(100)                not null,
    session_reference   varchar(100)                not null,
    act                 varchar(60)                 not null,
    subject_kind        varchar(60)                 not null,
    subject_id          varchar(120)                not null,
    subject_version     integer                     not null,
    before_text         text,
    after_text          text,
    reason              text,
    application_version varchar(40)                 not null,
    previous_hash       varchar(64)                    not null,
    entry_hash          varchar(64)                    not null
);
create index audit_entry_subject on audit_entry (subject_kind, subject_id);
create index audit_entry_recorded on audit_entry (recorded_at);
grant select, insert on audit_entry to shearbook_desk;
