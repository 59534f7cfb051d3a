-- Sessions belong to people, not to projects: the application's role ends them, it never deletes them.
GRANT UPDATE ON person_session TO holdground_app;
--> statement-breakpoint

-- The scripts that verify the record walk every project: this door shows which there are, and changes nothing.
CREATE POLICY verifier ON project FOR SELECT USING ((SELECT current_door()) = 'verifier');
--> statement-breakpoint

-- Coordinates and levels mean nothing without their grid and datum: no project without both, so no hole or footing.
ALTER TABLE project ADD CONSTRAINT project_has_grid_and_datum
  CHECK (btrim(grid_name) <> '' AND btrim(datum_name) <> '');
ALTER TABLE project ADD CONSTRAINT project_grid_is_usable
  CHECK (grid_scale > 0 AND grid_scale < 'Infinity' AND abs(grid_rotation_deg) <= 360);
