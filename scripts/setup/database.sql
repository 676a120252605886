-- What an empty database needs before its first migration. Run as an administrator, inside that database; may run again.
alter schema public owner to leafhalt_owner;
revoke create on schema public from public;
create schema if not exists graphile_worker authorization leafhalt_queue;
create schema if not exists queue authorization leafhalt_queue;
