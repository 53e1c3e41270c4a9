-- The desk's own user may read and add, never change or delete what is kept; the owner alone migrates.
do $$
begin
  if not exists (select from pg_roles where rolname = 'shearbook_desk') then
    create role shearbook_desk login;
  end if;
end
$$;
alter role shearbook_desk with password '${desk-password}';
grant usage on schema public to shearbook_desk;
-- Keys are drawn from sequences; H2 has no rights on sequences, so this stands here and not in each migration.
alter default privileges in schema public grant usage, select on sequences to shearbook_desk;
