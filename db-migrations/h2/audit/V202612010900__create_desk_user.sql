-- The desk's own user may read and add, never change or delete what is kept; the owner alone migrates.
create user if not exists shearbook_desk password '${desk-password}';
