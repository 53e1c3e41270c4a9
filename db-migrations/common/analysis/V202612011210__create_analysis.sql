-- Results of the methods on kept soundings, with the version of the method and the version of the sounding they are of.
-- The document holds everything but the levels, which the sounding has; the columns are what lists need.
create sequence analysis_version_seq start with 1 increment by 50;
create table analysis_version (
    row_id                     bigint                      not null primary key,
    sounding_id                bigint                      not null,
    version                    integer                     not null,
    sounding_version           integer                     not null,
    method_version             varchar(20)                 not null,
    window_m                   double precision            not null,
    not_analysed               varchar(400),
    stability_state            varchar(11)                 not null,
    lowest_richardson          double precision,
    lowest_richardson_height_m double precision,
    lowest_richardson_level    double precision,
    lowest_shear_1000_ft_kt    double precision,
    tropopause_height_m        double precision,
    tropopause_level           double precision,
    greatest_wind_ms           double precision,
    greatest_wind_level        double precision,
    greatest_wind_at_top       boolean                     not null,
    layer_count                integer                     not null,
    result_document            text,
    observed_at                timestamp(6) with time zone not null,
    received_at                timestamp(6) with time zone not null,
    recorded_at                timestamp(6) with time zone not null,
    constraint analysis_version_once unique (sounding_id, version)
);
grant select, insert on analysis_version to shearbook_desk;
