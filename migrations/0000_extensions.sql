-- Trigram search over parts; comes with PostgreSQL and may be created by the owner of a database.
create extension if not exists pg_trgm;
