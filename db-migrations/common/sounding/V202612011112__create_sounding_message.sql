-- Each message of an ascent as received: a correction replaces its own part, so the parts must be at hand one by one.
create sequence sounding_message_seq start with 1 increment by 50;
create table sounding_message (
    row_id         bigint                      not null primary key,
    sounding_id    bigint                      not null,
    version        integer                     not null,
    message_number integer                     not null,
    station_named  varchar(200)                not null,
    latitude_deg   double precision,
    longitude_deg  double precision,
    elevation_m    double precision,
    nominal_at     timestamp(6) with time zone,
    launched_at    timestamp(6) with time zone,
    parts          varchar(200)                not null,
    correction     varchar(40)                 not null,
    sonde_type     varchar(120)                not null,
    remarks        text                        not null,
    content_digest varchar(64)                 not null,
    raw            bytea                       not null,
    pressure_pa    double precision array,
    height_m       double precision array,
    temperature_k  double precision array,
    dew_point_k    double precision array,
    wind_from_deg  double precision array,
    wind_speed_ms  double precision array,
    elapsed_s      double precision array,
    level_latitude_deg  double precision array,
    level_longitude_deg double precision array,
    significance   text,
    observed_at    timestamp(6) with time zone not null,
    received_at    timestamp(6) with time zone not null,
    recorded_at    timestamp(6) with time zone not null,
    constraint sounding_message_once unique (sounding_id, message_number)
);
comment on column sounding_message.version is 'the version of the sounding that was current once this message was kept';
grant select, insert on sounding_message to shearbook_desk;
