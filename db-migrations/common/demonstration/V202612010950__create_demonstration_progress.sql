-- The play can be interrupted by the death of the process; each step is noted in the transaction of its act.
create table demonstration_step (
    step_number integer                     not null primary key,
    played_at   timestamp(6) with time zone not null
);
-- When the play was over, by the desk's clock and by the machine's: the desk's clock runs on from there.
create table demonstration_clock (
    clock_id   integer                     not null primary key,
    desk_at    timestamp(6) with time zone not null,
    machine_at timestamp(6) with time zone not null
);
grant select, insert on demonstration_step to shearbook_desk;
grant select, insert on demonstration_clock to shearbook_desk;
