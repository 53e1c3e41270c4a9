-- The levels of a version lie apart from its header, as arrays: lists of soundings must not read thousands of levels.
-- What was computed from them is kept too, so that a later change of a check does not change what was once known.
create table sounding_levels (
    row_id              bigint                 not null primary key references sounding_version (row_id),
    pressure_pa         double precision array not null,
    height_m            double precision array not null,
    temperature_k       double precision array not null,
    dew_point_k         double precision array not null,
    wind_from_deg       double precision array not null,
    wind_speed_ms       double precision array not null,
    elapsed_s           double precision array not null,
    latitude_deg        double precision array not null,
    longitude_deg       double precision array not null,
    significance        text                   not null,
    height_used_m       double precision array not null,
    pressure_used_pa    double precision array not null,
    flags               text                   not null,
    in_use              text                   not null,
    sounding_flags      text                   not null,
    remarks             text                   not null,
    surface_height_m    double precision,
    profile_temperature double precision array not null,
    profile_wind        double precision array not null,
    temperature_gaps_m  double precision array not null,
    wind_gaps_m         double precision array not null,
    profile_position    double precision array not null
);
comment on column sounding_levels.profile_temperature is 'height m, pressure Pa, temperature K, dew point K, for each level in turn; empty where there is no clean profile';
comment on column sounding_levels.profile_wind is 'height m, pressure Pa, eastward m/s, northward m/s, for each level in turn';
comment on column sounding_levels.profile_position is 'height m, elapsed s, latitude, longitude, for each level in turn';
grant select, insert on sounding_levels to shearbook_desk;
