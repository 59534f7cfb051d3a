#!/bin/sh
# Run once, by the database's image, when its folder is new: the two roles and the database that the owner owns.
set -eu
psql --username=postgres --dbname=postgres --set=ON_ERROR_STOP=1 \
  --set=owner_password="$OWNER_PASSWORD" --set=app_password="$APP_PASSWORD" <<'SQL'
CREATE ROLE holdground_owner LOGIN NOSUPERUSER NOBYPASSRLS PASSWORD :'owner_password';
CREATE ROLE holdground_app LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOBYPASSRLS PASSWORD :'app_password';
CREATE DATABASE holdground OWNER holdground_owner;
REVOKE ALL ON DATABASE holdground FROM PUBLIC;
GRANT CONNECT ON DATABASE holdground TO holdground_app;
SQL
