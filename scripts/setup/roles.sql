-- The three roles of a cluster, none a superuser. Run once as an administrator; in production give each a password.
create role leafhalt_owner login; -- owns the tables; runs migrations
create role leafhalt_queue login; -- owns the job queue; the worker's own connection
create role leafhalt_app login; -- owns nothing; the server and the worker's tasks
