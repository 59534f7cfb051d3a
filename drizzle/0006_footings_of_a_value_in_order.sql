-- The footings of one value, listed by mark: a page is read off this index and stops when it is full.
CREATE INDEX footing_value_mark_order ON footing (project_id, value_id, mark COLLATE natural_order, id);
