-- Run as the superuser on the server's maintenance database; it may be run again at any time.
DO $$
DECLARE
  role_name text;
BEGIN
  FOREACH role_name IN ARRAY ARRAY['fourfold_owner', 'fourfold_app', 'fourfold_lookup', 'fourfold_maintenance'] LOOP
    IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = role_name) THEN
      EXECUTE format('CREATE ROLE %I', role_name);
    END IF;
  END LOOP;
END
$$;

-- Owns the database and migrates it.
ALTER ROLE fourfold_owner LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOBYPASSRLS;
-- What web and worker connect as; row-level security always applies to it.
ALTER ROLE fourfold_app LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOBYPASSRLS;
-- Owns the functions that look up a token, an invitation or a grant before an organisation is known.
ALTER ROLE fourfold_lookup NOLOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOBYPASSRLS;
-- Reads everything: audit verification, sweeps, backups. It writes nothing.
ALTER ROLE fourfold_maintenance LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE BYPASSRLS;
ALTER ROLE fourfold_maintenance SET default_transaction_read_only = on;

GRANT fourfold_lookup TO fourfold_owner;
GRANT pg_read_all_data TO fourfold_maintenance;

SELECT 'CREATE DATABASE fourfold OWNER fourfold_owner'
WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = 'fourfold') \gexec

REVOKE ALL ON DATABASE fourfold FROM PUBLIC;
GRANT CONNECT ON DATABASE fourfold TO fourfold_app, fourfold_maintenance;

\connect fourfold
-- Which tables the application may touch, and how, is for the migrations to say, table by table.
GRANT USAGE ON SCHEMA public TO fourfold_app, fourfold_maintenance;
GRANT USAGE, CREATE ON SCHEMA public TO fourfold_lookup;
