-- The one place where the identity of an aircraft and the text that holds it lie, so that both can be forgotten.
-- The version keeps a digest that is worth nothing once the salt is gone.
create table air_report_identity (
    row_id    bigint        not null primary key,
    report_id bigint        not null,
    version   integer       not null,
    salt      bytea         not null,
    aircraft  varchar(60)   not null,
    raw_text  text          not null,
    constraint air_report_identity_once unique (report_id, version)
);
grant select, insert, delete on air_report_identity to shearbook_desk;
