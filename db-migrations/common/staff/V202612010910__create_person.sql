-- People are kept like everything else: an account that changes gets a new version.
create sequence person_version_seq start with 1 increment by 50;
create table person_version (
    row_id        bigint                      not null primary key,
    username      varchar(60)                 not null,
    version       integer                     not null,
    display_name  varchar(120)                not null,
    roles         varchar(200)                not null,
    password_hash varchar(200)                not null,
    enabled       boolean                     not null,
    observed_at   timestamp(6) with time zone not null,
    received_at   timestamp(6) with time zone not null,
    recorded_at   timestamp(6) with time zone not null,
    constraint person_version_once unique (username, version)
);
grant select, insert on person_version to shearbook_desk;
