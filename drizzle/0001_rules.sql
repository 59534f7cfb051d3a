-- What generated SQL cannot say: who may do what to which row, what may never change, and what is derived.

DO $$ BEGIN
  IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = 'holdground_app') THEN
    CREATE ROLE holdground_app LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOBYPASSRLS;
  END IF;
END $$;
--> statement-breakpoint

-- Pointers: each names a row of the same project, and only one that may count.
ALTER TABLE document_revision ADD CONSTRAINT document_revision_of_document UNIQUE (project_id, document_id, id);
ALTER TABLE document ADD CONSTRAINT document_current FOREIGN KEY (project_id, id, current_revision_id)
  REFERENCES document_revision (project_id, document_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE hole_revision ADD CONSTRAINT hole_revision_of_hole UNIQUE (project_id, hole_id, id);
ALTER TABLE hole ADD CONSTRAINT hole_current FOREIGN KEY (project_id, id, current_revision_id)
  REFERENCES hole_revision (project_id, hole_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE zone_revision ADD CONSTRAINT zone_revision_of_zone UNIQUE (project_id, zone_id, id);
ALTER TABLE zone ADD CONSTRAINT zone_current FOREIGN KEY (project_id, id, current_revision_id)
  REFERENCES zone_revision (project_id, zone_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE revision_issue ADD CONSTRAINT revision_issue_of_value UNIQUE (project_id, value_id, value_revision_id);
ALTER TABLE bearing_value ADD CONSTRAINT bearing_value_current FOREIGN KEY (project_id, id, current_revision_id)
  REFERENCES revision_issue (project_id, value_id, value_revision_id);
ALTER TABLE footing_revision ADD CONSTRAINT footing_revision_of_footing UNIQUE (project_id, footing_id, id);
ALTER TABLE footing ADD CONSTRAINT footing_current FOREIGN KEY (project_id, id, current_revision_id)
  REFERENCES footing_revision (project_id, footing_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE load_set ADD CONSTRAINT load_set_of_footing UNIQUE (project_id, footing_id, id);
ALTER TABLE footing ADD CONSTRAINT footing_loads FOREIGN KEY (project_id, id, current_load_set_id)
  REFERENCES load_set (project_id, footing_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE footing_check ADD CONSTRAINT footing_check_of_footing UNIQUE (project_id, footing_id, id);
ALTER TABLE footing ADD CONSTRAINT footing_latest_check FOREIGN KEY (project_id, id, latest_check_id)
  REFERENCES footing_check (project_id, footing_id, id) DEFERRABLE INITIALLY DEFERRED;
ALTER TABLE project ADD CONSTRAINT project_criteria FOREIGN KEY (id, current_criteria)
  REFERENCES criteria (project_id, number) DEFERRABLE INITIALLY DEFERRED;
--> statement-breakpoint

-- Settings of the current transaction. An unset project matches no row.
CREATE FUNCTION current_project() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.project_id', true), '')::uuid $$;
CREATE FUNCTION current_person() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT nullif(current_setting('app.person_id', true), '')::uuid $$;
CREATE FUNCTION current_door() RETURNS text LANGUAGE sql STABLE PARALLEL SAFE AS
  $$ SELECT coalesce(current_setting('app.door', true), '') $$;
--> statement-breakpoint

-- Row level security: every table that carries a project shows the current project's rows and no other.
DO $$ DECLARE t text; BEGIN
  FOR t IN
    SELECT c.relname FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
    JOIN pg_attribute a ON a.attrelid = c.oid AND a.attname = 'project_id' AND NOT a.attisdropped
    WHERE n.nspname = 'public' AND c.relkind = 'r' AND c.relname NOT IN ('membership', 'outbox', 'one_time_link')
  LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', t);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', t);
    EXECUTE format('CREATE POLICY in_project ON %I USING (project_id = (SELECT current_project()))
                    WITH CHECK (project_id = (SELECT current_project()))', t);
  END LOOP;
END $$;
--> statement-breakpoint

-- A person sees own memberships everywhere (the list of projects), and a project's memberships inside it.
ALTER TABLE membership ENABLE ROW LEVEL SECURITY;
ALTER TABLE membership FORCE ROW LEVEL SECURITY;
CREATE POLICY in_project ON membership USING (project_id = (SELECT current_project()))
  WITH CHECK (project_id = (SELECT current_project()));
CREATE POLICY own_memberships ON membership FOR SELECT USING (person_id = (SELECT current_person()));

ALTER TABLE project ENABLE ROW LEVEL SECURITY;
ALTER TABLE project FORCE ROW LEVEL SECURITY;
CREATE POLICY in_project ON project USING (id = (SELECT current_project()))
  WITH CHECK (id = (SELECT current_project()));
CREATE POLICY own_projects ON project FOR SELECT USING (EXISTS (
  SELECT FROM membership m WHERE m.project_id = project.id AND m.person_id = (SELECT current_person())));

-- Mail and single-use links belong to no one project: any transaction may queue, two named doors may read.
ALTER TABLE outbox ENABLE ROW LEVEL SECURITY;
ALTER TABLE outbox FORCE ROW LEVEL SECURITY;
CREATE POLICY queue ON outbox FOR INSERT WITH CHECK (project_id IS NULL OR project_id = (SELECT current_project()));
CREATE POLICY relay ON outbox USING ((SELECT current_door()) = 'relay') WITH CHECK ((SELECT current_door()) = 'relay');
ALTER TABLE one_time_link ENABLE ROW LEVEL SECURITY;
ALTER TABLE one_time_link FORCE ROW LEVEL SECURITY;
CREATE POLICY in_project ON one_time_link USING (project_id = (SELECT current_project()))
  WITH CHECK (project_id = (SELECT current_project()));
CREATE POLICY accounts ON one_time_link USING ((SELECT current_door()) = 'accounts')
  WITH CHECK ((SELECT current_door()) = 'accounts');
--> statement-breakpoint

-- Append-only: no UPDATE, no DELETE, no TRUNCATE, whoever asks.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$ BEGIN
  RAISE EXCEPTION '% is append-only: % is refused', TG_TABLE_NAME, TG_OP USING ERRCODE = 'restrict_violation';
END $$;
DO $$ DECLARE t text; BEGIN
  FOREACH t IN ARRAY ARRAY['document_revision', 'data_issue', 'hole_revision', 'stratum', 'spt', 'water_strike',
    'zone_revision', 'criteria', 'bearing_value_revision', 'value_source', 'revision_issue', 'revision_withdrawal',
    'source_confirmation', 'footing_revision', 'load_set', 'footing_link', 'stage_event', 'footing_check', 'change',
    'consequence', 'disposition', 'change_closure', 'inspection', 'audit_event', 'site_event']
  LOOP
    EXECUTE format('CREATE TRIGGER append_only BEFORE UPDATE OR DELETE ON %I
                    FOR EACH ROW EXECUTE FUNCTION refuse_change()', t);
    EXECUTE format('CREATE TRIGGER append_only_whole BEFORE TRUNCATE ON %I
                    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()', t);
  END LOOP;
END $$;
--> statement-breakpoint

-- The application's role: reads and adds; changes only what is not append-only; deletes only what is a working copy.
REVOKE ALL ON SCHEMA public FROM PUBLIC;
GRANT USAGE ON SCHEMA public TO holdground_app;
GRANT SELECT, INSERT ON ALL TABLES IN SCHEMA public TO holdground_app;
GRANT USAGE ON ALL SEQUENCES IN SCHEMA public TO holdground_app;
ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT SELECT, INSERT ON TABLES TO holdground_app;
ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT USAGE ON SEQUENCES TO holdground_app;
GRANT UPDATE ON person, one_time_link, project, membership, api_token, document, upload, hole, ground_unit,
  stratum_assignment, zone, bearing_value, bearing_value_draft, footing, outbox TO holdground_app;
GRANT DELETE ON membership, sign_in_attempt, stratum_assignment, zone_ground_unit, bearing_value_draft, upload,
  idempotent_answer TO holdground_app;
--> statement-breakpoint

-- Audit: a chain of hashes per project. The lock makes one writer at a time extend it; it is held until commit.
CREATE FUNCTION chain_audit_event() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE last record;
BEGIN
  PERFORM pg_advisory_xact_lock(hashtextextended('audit ' || NEW.project_id::text, 0));
  SELECT seq, hash INTO last FROM audit_event WHERE project_id = NEW.project_id ORDER BY seq DESC LIMIT 1;
  NEW.seq := coalesce(last.seq, 0) + 1;
  NEW.at := clock_timestamp();
  NEW.previous_hash := coalesce(last.hash, repeat('0', 64));
  NEW.hash := encode(sha256(convert_to(concat_ws(E'\n', NEW.previous_hash, NEW.project_id, NEW.seq,
    to_char(NEW.at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'), NEW.actor_id, NEW.roles, NEW.verb,
    NEW.subject, NEW.request_id, NEW.detail), 'UTF8')), 'hex');
  RETURN NEW;
END $$;
CREATE TRIGGER chain BEFORE INSERT ON audit_event FOR EACH ROW EXECUTE FUNCTION chain_audit_event();
--> statement-breakpoint

-- Open browsers hear of a change when its transaction commits. Listeners re-read; the payload only names it.
CREATE FUNCTION tell_change() RETURNS trigger LANGUAGE plpgsql AS $$ BEGIN
  PERFORM pg_notify('holdground_change', json_build_object('projectId', NEW.project_id, 'changeId', NEW.id)::text);
  RETURN NULL;
END $$;
CREATE TRIGGER tell AFTER INSERT ON change FOR EACH ROW EXECUTE FUNCTION tell_change();
--> statement-breakpoint

-- State of a revision: derived from what was done to it.
CREATE VIEW bearing_value_revision_state WITH (security_invoker = true) AS
SELECT r.project_id, r.value_id, r.id AS value_revision_id, r.number, r.code,
  CASE WHEN w.value_revision_id IS NOT NULL THEN 'withdrawn'
       WHEN v.current_revision_id = r.id THEN 'issued'
       WHEN i.value_revision_id IS NOT NULL THEN 'superseded'
       ELSE 'checked' END AS state,
  i.issued_by, i.issued_at, w.withdrawn_by, w.withdrawn_at, w.reason AS withdrawal_reason
FROM bearing_value_revision r
JOIN bearing_value v ON v.project_id = r.project_id AND v.id = r.value_id
LEFT JOIN revision_issue i ON i.project_id = r.project_id AND i.value_revision_id = r.id
LEFT JOIN revision_withdrawal w ON w.project_id = r.project_id AND w.value_revision_id = r.id;
--> statement-breakpoint

-- Standing of a check: its pins compared with what counts now. IS DISTINCT FROM, so that a pointer that is gone shows.
CREATE VIEW check_standing WITH (security_invoker = true) AS
SELECT s.*, CASE WHEN s.replaced THEN 'replaced' WHEN cardinality(s.reason_codes) > 0 THEN 'affected' ELSE 'current' END
  AS standing
FROM (
  SELECT c.project_id, c.id AS check_id, c.footing_id, c.seq,
    f.latest_check_id IS DISTINCT FROM c.id AS replaced,
    array_remove(ARRAY[
      CASE WHEN f.value_id IS DISTINCT FROM c.value_id THEN 'link' END,
      CASE WHEN v.current_revision_id IS DISTINCT FROM c.value_revision_id THEN 'value' END,
      CASE WHEN src.sentence IS NOT NULL THEN 'source' END,
      CASE WHEN z.current_revision_id IS DISTINCT FROM c.zone_revision_id THEN 'zone' END,
      CASE WHEN f.current_load_set_id IS DISTINCT FROM c.load_set_id THEN 'loads' END,
      CASE WHEN f.current_revision_id IS DISTINCT FROM c.footing_revision_id THEN 'footing' END,
      CASE WHEN p.current_criteria IS DISTINCT FROM c.criteria_number THEN 'criteria' END,
      CASE WHEN h.sentence IS NOT NULL THEN 'holes' END,
      CASE WHEN n.sentence IS NOT NULL THEN 'inspection' END,
      CASE WHEN e.engine <> c.engine_version THEN 'method' END
    ], NULL) AS reason_codes,
    array_remove(ARRAY[
      CASE WHEN f.value_id IS DISTINCT FROM c.value_id THEN
        CASE WHEN f.value_id IS NULL THEN 'footing no longer linked to a value' ELSE 'footing linked to another value' END END,
      CASE WHEN v.current_revision_id IS DISTINCT FROM c.value_revision_id THEN
        CASE WHEN v.current_revision_id IS NULL THEN 'bearing value ' || pinned.code || ' withdrawn'
             ELSE 'bearing value revised ' || pinned.code || ' → ' || latest.code END END,
      src.sentence,
      CASE WHEN z.current_revision_id IS DISTINCT FROM c.zone_revision_id THEN 'zone boundary moved' END,
      CASE WHEN f.current_load_set_id IS DISTINCT FROM c.load_set_id THEN 'loads changed' END,
      CASE WHEN f.current_revision_id IS DISTINCT FROM c.footing_revision_id THEN 'footing revised' END,
      CASE WHEN p.current_criteria IS DISTINCT FROM c.criteria_number THEN
        'criteria changed ' || c.criteria_number || ' → ' || p.current_criteria END,
      h.sentence,
      n.sentence,
      CASE WHEN e.engine <> c.engine_version THEN 'method corrected ' || c.engine_version || ' → ' || e.engine END
    ], NULL) AS reasons
  FROM footing_check c
  JOIN footing f ON f.project_id = c.project_id AND f.id = c.footing_id
  JOIN project p ON p.id = c.project_id
  LEFT JOIN bearing_value v ON v.project_id = c.project_id AND v.id = c.value_id
  LEFT JOIN bearing_value_revision pinned ON pinned.project_id = c.project_id AND pinned.id = c.value_revision_id
  LEFT JOIN bearing_value_revision latest ON latest.project_id = c.project_id AND latest.id = v.current_revision_id
  LEFT JOIN zone z ON z.project_id = c.project_id AND z.id = v.zone_id
  LEFT JOIN LATERAL (
    SELECT 'source ' || string_agg(d.reference || ' superseded ' || dr.code || ' → ' || dn.code, '; ') AS sentence
    FROM value_source s
    JOIN document_revision dr ON dr.project_id = s.project_id AND dr.id = s.document_revision_id
    JOIN document d ON d.project_id = s.project_id AND d.id = dr.document_id
    JOIN document_revision dn ON dn.project_id = s.project_id AND dn.id = d.current_revision_id
    WHERE s.project_id = c.project_id AND s.value_revision_id = c.value_revision_id
      AND d.current_revision_id IS DISTINCT FROM s.document_revision_id
      AND NOT EXISTS (SELECT FROM source_confirmation k WHERE k.project_id = s.project_id
        AND k.value_revision_id = s.value_revision_id AND k.document_revision_id = d.current_revision_id)
  ) src ON true
  LEFT JOIN LATERAL (
    SELECT 'log of ' || string_agg(o.name, ', ' ORDER BY o.name) || ' revised' AS sentence
    FROM unnest(c.hole_revision_ids) AS pin(id)
    JOIN hole_revision hr ON hr.project_id = c.project_id AND hr.id = pin.id
    JOIN hole o ON o.project_id = c.project_id AND o.id = hr.hole_id
    WHERE o.current_revision_id IS DISTINCT FROM pin.id
  ) h ON cardinality(c.hole_revision_ids) > 0
  LEFT JOIN LATERAL (
    SELECT 'inspection found other ground' AS sentence FROM inspection i
    WHERE i.project_id = c.project_id AND i.footing_id = c.footing_id AND NOT i.as_expected AND i.recorded_at > c.run_at
    LIMIT 1
  ) n ON true
  CROSS JOIN LATERAL (SELECT coalesce(nullif(current_setting('app.engine', true), ''), c.engine_version) AS engine) e
) s;
--> statement-breakpoint

GRANT SELECT ON bearing_value_revision_state, check_standing TO holdground_app;
