-- Fixes come as whole lists, tens of thousands of rows at a time. A list loaded anew is a new version of it.
create sequence fix_list_version_seq start with 1 increment by 50;
create table fix_list_version (
    row_id      bigint                      not null primary key,
    list_name   varchar(60)                 not null,
    version     integer                     not null,
    fix_count   integer                     not null,
    observed_at timestamp(6) with time zone not null,
    received_at timestamp(6) with time zone not null,
    recorded_at timestamp(6) with time zone not null,
    constraint fix_list_version_once unique (list_name, version)
);
create index fix_list_version_recorded on fix_list_version (recorded_at);
grant select, insert on fix_list_version to shearbook_desk;

create table fix (
    list_row_id                 bigint           not null references fix_list_version (row_id),
    row_number_in_list          integer          not null,
    identifier                  varchar(40)      not null,
    kind                        varchar(40)      not null,
    name                        varchar(200)     not null,
    latitude_deg                double precision not null,
    longitude_deg               double precision not null,
    elevation_m                 double precision,
    magnetic_variation_east_deg double precision,
    constraint fix_once primary key (list_row_id, row_number_in_list)
);
create index fix_identifier on fix (identifier);
grant select, insert on fix to shearbook_desk;
