-- What a forecaster ticked as the reason for a version: which forecasts used a report can be asked.
create table forecast_evidence (
    forecast_row_id bigint      not null references forecast_version (row_id),
    list_index      integer     not null,
    subject_kind    varchar(20) not null,
    subject_id      bigint      not null,
    label           text        not null,
    primary key (forecast_row_id, list_index)
);
create index forecast_evidence_subject on forecast_evidence (subject_kind, subject_id);
grant select, insert on forecast_evidence to shearbook_desk;
