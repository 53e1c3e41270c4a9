-- The queue of what needs a person. Each item is kept in versions: open, then settled by somebody with a reason.
create sequence intake_item_seq start with 1 increment by 1;
create table intake_item_version (
    item_id        bigint                      not null,
    version        integer                     not null,
    batch_id       bigint                      not null,
    arrival_number integer                     not null,
    line_number    integer                     not null,
    column_number  integer                     not null,
    reason_code    varchar(60)                 not null,
    state          varchar(20)                 not null,
    settled_by     varchar(100),
    settled_reason varchar(400),
    observed_at    timestamp(6) with time zone not null,
    received_at    timestamp(6) with time zone not null,
    recorded_at    timestamp(6) with time zone not null,
    constraint intake_item_once primary key (item_id, version)
);
create index intake_item_batch on intake_item_version (batch_id);
create index intake_item_state on intake_item_version (state);
grant select, insert on intake_item_version to shearbook_desk;

-- The text of an item and what was said of it may quote the name of an aircraft, so it can be forgotten too. No raw text: the whole arrival is meant.
create table intake_item_text (
    item_id    bigint not null primary key,
    batch_id   bigint not null,
    what_to_do text   not null,
    raw        bytea
);
grant select, insert, delete on intake_item_text to shearbook_desk;
