-- Drafts as typed. What was never issued is thinking, to be forgotten after a month: so it lies apart and may be deleted.
create table forecast_draft (
    row_id           bigint                      not null primary key,
    forecast_id      bigint                      not null,
    version          integer                     not null,
    purpose          varchar(20)                 not null,
    based_on_version integer,
    state            varchar(20)                 not null,
    author           varchar(100)                not null,
    fields           json                        not null,
    prefilled        json                        not null,
    reason           text                        not null,
    observed_at      timestamp(6) with time zone not null,
    received_at      timestamp(6) with time zone not null,
    recorded_at      timestamp(6) with time zone not null,
    constraint forecast_draft_once unique (forecast_id, version)
);
grant select, insert, delete on forecast_draft to shearbook_desk;
