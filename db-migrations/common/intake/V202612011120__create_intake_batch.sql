-- One act of taking in: what came, what became of it. The bytes lie apart, because they may name aircraft and must be forgotten in time.
create sequence intake_batch_seq start with 1 increment by 1;
create table intake_batch (
    batch_id        bigint                      not null primary key,
    channel         varchar(40)                 not null,
    actor           varchar(100)                not null,
    arrival_count   integer                     not null,
    accepted_count  integer                     not null,
    duplicate_count integer                     not null,
    queued_count    integer                     not null,
    refused_count   integer                     not null,
    content_digest  varchar(64)                 not null,
    observed_at     timestamp(6) with time zone not null,
    received_at     timestamp(6) with time zone not null,
    recorded_at     timestamp(6) with time zone not null
);
create index intake_batch_recorded on intake_batch (recorded_at);
grant select, insert on intake_batch to shearbook_desk;

create table intake_arrival (
    batch_id       bigint        not null references intake_batch (batch_id),
    arrival_number integer       not null,
    arrival_name   varchar(200)  not null,
    byte_count     bigint        not null,
    source_format  varchar(40)   not null,
    accepted_count integer       not null,
    queued_count   integer       not null,
    refused_code   varchar(60),
    refused_text   varchar(1000),
    salted_digest  varchar(64)   not null,
    constraint intake_arrival_once primary key (batch_id, arrival_number)
);
grant select, insert on intake_arrival to shearbook_desk;

create table intake_record (
    batch_id       bigint      not null references intake_batch (batch_id),
    record_number  integer     not null,
    arrival_number integer     not null,
    line_number    integer     not null,
    record_kind    varchar(20) not null,
    record_id      bigint      not null,
    record_version integer     not null,
    duplicate      boolean     not null,
    remark_count   integer     not null,
    constraint intake_record_once primary key (batch_id, record_number)
);
grant select, insert on intake_record to shearbook_desk;
