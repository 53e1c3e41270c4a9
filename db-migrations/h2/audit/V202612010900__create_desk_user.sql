-- The desk's own user may read and add, never change or delete what is kept; the owner alone migrates.
create user if not exists shearbook_desk password '${desk-password}';
-- Without this the embedded database acknowledges before it writes, and a killed process loses acts.
set write_delay 0;
