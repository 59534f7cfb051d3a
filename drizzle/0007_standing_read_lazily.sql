-- The standing of a check as before, in a form where each part is worked out only when it is read: a list that asks for
-- the standing alone pays for no sentence, and one page of it for no more than its rows. What is superseded among
-- sources and holes is found once a query, not once a check.
CREATE OR REPLACE VIEW check_standing WITH (security_invoker = true) AS
SELECT s.project_id, s.check_id, s.footing_id, s.seq, s.replaced,
  array_remove(ARRAY[
    CASE WHEN s.link_moved THEN 'link' END,
    CASE WHEN s.value_moved THEN 'value' END,
    CASE WHEN s.source_moved THEN 'source' END,
    CASE WHEN s.zone_moved THEN 'zone' END,
    CASE WHEN s.loads_moved THEN 'loads' END,
    CASE WHEN s.footing_moved THEN 'footing' END,
    CASE WHEN s.criteria_moved THEN 'criteria' END,
    CASE WHEN s.holes_moved THEN 'holes' END,
    CASE WHEN s.other_ground THEN 'inspection' END,
    CASE WHEN s.method_moved THEN 'method' END
  ], NULL) AS reason_codes,
  array_remove(ARRAY[
    CASE WHEN s.link_moved THEN
      CASE WHEN s.linked_value_id IS NULL THEN 'footing no longer linked to a value' ELSE 'footing linked to another value' END END,
    CASE WHEN s.value_moved THEN (
      SELECT CASE WHEN s.value_now IS NULL THEN 'bearing value ' || pinned.code || ' withdrawn'
        ELSE 'bearing value revised ' || pinned.code || ' → ' || (SELECT latest.code FROM bearing_value_revision latest
          WHERE latest.project_id = s.project_id AND latest.id = s.value_now) END
      FROM bearing_value_revision pinned WHERE pinned.project_id = s.project_id AND pinned.id = s.value_pinned) END,
    CASE WHEN s.source_moved THEN (
      SELECT 'source ' || string_agg(d.reference || ' superseded ' || dr.code || ' → ' || dn.code, '; '
        ORDER BY d.reference, dr.code)
      FROM value_source c
      JOIN document_revision dr ON dr.project_id = c.project_id AND dr.id = c.document_revision_id
      JOIN document d ON d.project_id = c.project_id AND d.id = dr.document_id
      JOIN document_revision dn ON dn.project_id = c.project_id AND dn.id = d.current_revision_id
      WHERE c.project_id = s.project_id AND c.value_revision_id = s.value_pinned
        AND d.current_revision_id IS DISTINCT FROM c.document_revision_id
        AND NOT EXISTS (SELECT FROM source_confirmation k WHERE k.project_id = c.project_id
          AND k.value_revision_id = c.value_revision_id AND k.document_revision_id = d.current_revision_id)) END,
    CASE WHEN s.zone_moved THEN 'zone boundary moved' END,
    CASE WHEN s.loads_moved THEN 'loads changed' END,
    CASE WHEN s.footing_moved THEN 'footing revised' END,
    CASE WHEN s.criteria_moved THEN 'criteria changed ' || s.criteria_number || ' → ' || s.criteria_now END,
    CASE WHEN s.holes_moved THEN (
      SELECT 'log of ' || string_agg(o.name, ', ' ORDER BY o.name) || ' revised'
      FROM unnest(s.hole_revision_ids) AS pin(id)
      JOIN hole_revision hr ON hr.project_id = s.project_id AND hr.id = pin.id
      JOIN hole o ON o.project_id = s.project_id AND o.id = hr.hole_id
      WHERE o.current_revision_id IS DISTINCT FROM pin.id) END,
    CASE WHEN s.other_ground THEN 'inspection found other ground' END,
    CASE WHEN s.method_moved THEN 'method corrected ' || s.engine_version || ' → ' || s.engine_now END
  ], NULL) AS reasons,
  CASE WHEN s.replaced THEN 'replaced'
       WHEN s.value_moved OR s.link_moved OR s.zone_moved OR s.loads_moved OR s.footing_moved OR s.criteria_moved
         OR s.method_moved OR s.source_moved OR s.holes_moved OR s.other_ground THEN 'affected'
       ELSE 'current' END AS standing
FROM (
  SELECT c.project_id, c.id AS check_id, c.footing_id, c.seq, c.hole_revision_ids, c.criteria_number, c.engine_version,
    c.value_revision_id AS value_pinned, v.current_revision_id AS value_now, f.value_id AS linked_value_id,
    p.current_criteria AS criteria_now, nullif(current_setting('app.engine', true), '') AS engine_now,
    f.latest_check_id IS DISTINCT FROM c.id AS replaced,
    f.value_id IS DISTINCT FROM c.value_id AS link_moved,
    v.current_revision_id IS DISTINCT FROM c.value_revision_id AS value_moved,
    z.current_revision_id IS DISTINCT FROM c.zone_revision_id AS zone_moved,
    f.current_load_set_id IS DISTINCT FROM c.load_set_id AS loads_moved,
    f.current_revision_id IS DISTINCT FROM c.footing_revision_id AS footing_moved,
    p.current_criteria IS DISTINCT FROM c.criteria_number AS criteria_moved,
    coalesce(nullif(current_setting('app.engine', true), '') <> c.engine_version, false) AS method_moved,
    c.value_revision_id IN (
      SELECT u.value_revision_id FROM value_source u
      JOIN document_revision dr ON dr.project_id = u.project_id AND dr.id = u.document_revision_id
      JOIN document d ON d.project_id = u.project_id AND d.id = dr.document_id
      WHERE d.current_revision_id IS DISTINCT FROM u.document_revision_id AND d.current_revision_id IS NOT NULL
        AND NOT EXISTS (SELECT FROM source_confirmation k WHERE k.project_id = u.project_id
          AND k.value_revision_id = u.value_revision_id AND k.document_revision_id = d.current_revision_id)
    ) AS source_moved,
    c.hole_revision_ids && ARRAY(
      SELECT hr.id FROM hole o JOIN hole_revision hr ON hr.project_id = o.project_id AND hr.hole_id = o.id
      WHERE o.current_revision_id IS DISTINCT FROM hr.id) AS holes_moved,
    EXISTS (SELECT FROM inspection i WHERE i.project_id = c.project_id AND i.footing_id = c.footing_id
      AND NOT i.as_expected AND i.recorded_at > c.run_at) AS other_ground
  FROM footing_check c
  JOIN footing f ON f.project_id = c.project_id AND f.id = c.footing_id
  JOIN project p ON p.id = c.project_id
  LEFT JOIN bearing_value v ON v.project_id = c.project_id AND v.id = c.value_id
  LEFT JOIN zone z ON z.project_id = c.project_id AND z.id = v.zone_id
) s;
