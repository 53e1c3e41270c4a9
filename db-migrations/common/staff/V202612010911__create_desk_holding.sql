-- Who holds the desk. One line of versions: the unique number lets one of two takers win. A null holder is a vacant desk.
create sequence desk_holding_seq start with 1 increment by 50;
create table desk_holding (
    row_id      bigint                      not null primary key,
    version     integer                     not null,
    holder      varchar(60),
    reason      varchar(400),
    observed_at timestamp(6) with time zone not null,
    received_at timestamp(6) with time zone not null,
    recorded_at timestamp(6) with time zone not null,
    constraint desk_holding_once unique (version)
);
grant select, insert on desk_holding to shearbook_desk;
