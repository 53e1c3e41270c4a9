-- Air-reports, every version of them. What could name an aircraft is not here but in air_report_identity.
create sequence air_report_seq start with 1 increment by 1;
create sequence air_report_version_seq start with 1 increment by 50;
create table air_report_version (
    row_id              bigint                      not null primary key,
    report_id           bigint                      not null,
    version             integer                     not null,
    source_id           varchar(120),
    report_class        varchar(3)                  not null,
    null_policy         varchar(10)                 not null,
    urgent              boolean                     not null,
    place_text          varchar(400)                not null,
    latitude_deg        double precision,
    longitude_deg       double precision,
    resolved_by         varchar(80),
    place_candidates    text,
    flight_level        double precision,
    turbulence          text,
    worst_intensity     varchar(5),
    worst_basis         varchar(120),
    edr_mean            double precision,
    edr_peak            double precision,
    gust_ms             double precision,
    wind_from_deg       double precision,
    wind_speed_ms       double precision,
    temperature_k       double precision,
    cloud               varchar(8)                  not null,
    aircraft_type       varchar(40),
    weight_class        varchar(1),
    remark              text,
    decoding_remarks    text,
    attribution         varchar(13)                 not null,
    attribution_reason  varchar(400),
    identity_digest     varchar(64)                 not null,
    observed_at         timestamp(6) with time zone not null,
    received_at         timestamp(6) with time zone not null,
    recorded_at         timestamp(6) with time zone not null,
    constraint air_report_version_once unique (report_id, version)
);
create index air_report_version_observed on air_report_version (observed_at, report_id);
grant select, insert on air_report_version to shearbook_desk;
