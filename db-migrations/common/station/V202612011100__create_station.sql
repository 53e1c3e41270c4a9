-- Launch sites are kept in versions: a station that moved must not move the ascents that were launched before.
create sequence station_version_seq start with 1 increment by 50;
create table station_version (
    row_id       bigint                      not null primary key,
    station_id   varchar(40)                 not null,
    version      integer                     not null,
    name         varchar(200)                not null,
    latitude_deg double precision            not null,
    longitude_deg double precision           not null,
    elevation_m  double precision,
    identifiers  text                        not null,
    observed_at  timestamp(6) with time zone not null,
    received_at  timestamp(6) with time zone not null,
    recorded_at  timestamp(6) with time zone not null,
    constraint station_version_once unique (station_id, version)
);
create index station_version_recorded on station_version (recorded_at);
grant select, insert on station_version to shearbook_desk;
