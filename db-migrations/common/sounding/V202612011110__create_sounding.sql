-- An ascent is kept in versions: a later part, a correction or a withdrawal is a new version of the same sounding.
create sequence sounding_id_seq start with 1 increment by 1;
create sequence sounding_version_seq start with 1 increment by 50;
create table sounding_version (
    row_id                bigint                      not null primary key,
    sounding_id           bigint                      not null,
    version               integer                     not null,
    station_id            varchar(60)                 not null,
    station_name          varchar(200)                not null,
    source_format         varchar(40)                 not null,
    nominal_at            timestamp(6) with time zone,
    launched_at           timestamp(6) with time zone,
    latitude_deg          double precision,
    longitude_deg         double precision,
    elevation_m           double precision,
    parts                 varchar(200)                not null,
    correction            varchar(40)                 not null,
    sonde_type            varchar(120)                not null,
    level_count           integer                     not null,
    top_pressure_pa       double precision,
    lowest_temperature_k  double precision,
    lowest_temperature_pa double precision,
    greatest_wind_ms      double precision,
    greatest_wind_from_deg double precision,
    greatest_wind_pa      double precision,
    not_usable            text,
    withdrawn             boolean                     not null,
    withdrawn_reason      varchar(400),
    content_digest        varchar(64)                 not null,
    observed_at           timestamp(6) with time zone not null,
    received_at           timestamp(6) with time zone not null,
    recorded_at           timestamp(6) with time zone not null,
    constraint sounding_version_once unique (sounding_id, version)
);
create index sounding_version_station on sounding_version (station_id, observed_at);
create index sounding_version_observed on sounding_version (observed_at);
create index sounding_version_recorded on sounding_version (recorded_at);
grant select, insert on sounding_version to shearbook_desk;
