-- What was done, found and signed is only ever added to. The rule is the database's own, so that no code can forget it.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only: % refused', TG_TABLE_NAME, TG_OP USING ERRCODE = 'restrict_violation';
END
$$;
--> statement-breakpoint
CREATE TRIGGER timeline_events_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON "timeline_events" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER findings_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON "findings" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER signatures_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON "signatures" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
