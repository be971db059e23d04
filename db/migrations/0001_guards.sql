-- Rows that record what happened are only ever added.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'rows of % are only added, never changed', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END;
$$;
--> statement-breakpoint
CREATE TRIGGER audit_entries_append_only BEFORE UPDATE OR DELETE ON audit_entries
  FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER audit_entries_no_truncate BEFORE TRUNCATE ON audit_entries
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER tally_revisions_append_only BEFORE UPDATE OR DELETE ON tally_revisions
  FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER tally_revisions_no_truncate BEFORE TRUNCATE ON tally_revisions
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER signal_history_append_only BEFORE UPDATE OR DELETE ON signal_history
  FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
-- A proportion's events are a part of its denominator; checked here too, where both stand in one row.
CREATE FUNCTION check_tally_pair() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF (SELECT kind FROM indicators WHERE id = NEW.indicator_id) = 'proportion' THEN
    RAISE EXCEPTION 'numerator above denominator' USING ERRCODE = 'check_violation';
  END IF;
  RETURN NEW;
END;
$$;
--> statement-breakpoint
-- The cheap half of the question stands in WHEN: it saves a look-up for nearly every row of a large import.
CREATE TRIGGER tallies_pair BEFORE INSERT OR UPDATE ON tallies
  FOR EACH ROW WHEN (NEW.numerator > NEW.denominator OR NEW.charted_numerator > NEW.charted_denominator)
  EXECUTE FUNCTION check_tally_pair();
--> statement-breakpoint
-- The kind decides the mathematics of every month counted so far.
CREATE FUNCTION refuse_kind_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW.kind <> OLD.kind AND EXISTS (SELECT 1 FROM tallies WHERE indicator_id = OLD.id) THEN
    RAISE EXCEPTION 'kind is fixed once a tally exists' USING ERRCODE = 'check_violation';
  END IF;
  RETURN NEW;
END;
$$;
--> statement-breakpoint
CREATE TRIGGER indicators_kind_fixed BEFORE UPDATE ON indicators
  FOR EACH ROW EXECUTE FUNCTION refuse_kind_change();
--> statement-breakpoint
INSERT INTO audit_head (id, seq, hash) VALUES (1, 0, repeat('0', 64));
