-- A baseline is never altered: whoever writes to the database, by whatever road, is refused. (A person
-- with the rights of a superuser can switch triggers off; the digest shows what was altered then.)
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
	RAISE EXCEPTION '% cannot be changed: % is refused', TG_TABLE_NAME, TG_OP
		USING ERRCODE = 'restrict_violation';
END;
$$;
--> statement-breakpoint
CREATE TRIGGER baseline_sealed BEFORE UPDATE OR DELETE ON "baseline"
	FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER baseline_kept BEFORE TRUNCATE ON "baseline"
	FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER baseline_evidence_sealed BEFORE UPDATE OR DELETE ON "baseline_evidence"
	FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
CREATE TRIGGER baseline_evidence_kept BEFORE TRUNCATE ON "baseline_evidence"
	FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
