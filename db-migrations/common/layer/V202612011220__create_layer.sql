-- Shear layers as proposed by the analysis of a sounding. A new version of the sounding makes new versions of its layers;
-- a layer that is no longer found gets a last version that does not stand.
create sequence layer_seq start with 1 increment by 1;
create sequence layer_version_seq start with 1 increment by 50;
create table layer_version (
    row_id                 bigint                      not null primary key,
    layer_id               bigint                      not null,
    version                integer                     not null,
    standing               boolean                     not null,
    sounding_id            bigint                      not null,
    sounding_version       integer                     not null,
    station_id             varchar(60)                 not null,
    station_name           varchar(200)                not null,
    letter                 varchar(3)                  not null,
    base_m                 double precision            not null,
    top_m                  double precision            not null,
    base_level             double precision,
    top_level              double precision,
    depth_m                double precision            not null,
    min_richardson         double precision            not null,
    min_richardson_m       double precision            not null,
    min_richardson_level   double precision,
    bulk_richardson        double precision,
    window_m               double precision            not null,
    max_shear_per_s        double precision            not null,
    shear_1000_ft_kt       double precision,
    wind_change_ms         double precision            not null,
    shear_direction_deg    double precision            not null,
    mean_wind_from_deg     double precision            not null,
    mean_wind_ms           double precision            not null,
    rule_wavelength_m      double precision,
    rule_e_folding_s       double precision,
    rule_basis             varchar(60)                 not null,
    latitude_deg           double precision,
    longitude_deg          double precision,
    saturated              boolean,
    stability_state        varchar(11)                 not null,
    remark_codes           varchar(400)                not null,
    observed_at            timestamp(6) with time zone not null,
    received_at            timestamp(6) with time zone not null,
    recorded_at            timestamp(6) with time zone not null,
    constraint layer_version_once unique (layer_id, version)
);
create index layer_version_sounding on layer_version (sounding_id);
create index layer_version_observed on layer_version (observed_at, layer_id);
grant select, insert on layer_version to shearbook_desk;
