-- One station has a block number, a WIGOS identifier, an indicator; messages use any of them. Identifiers are only ever added.
create table station_identifier (
    identifier  varchar(40)                 not null primary key,
    station_id  varchar(40)                 not null,
    recorded_at timestamp(6) with time zone not null
);
grant select, insert on station_identifier to shearbook_desk;
