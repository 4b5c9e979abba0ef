-- Rows that never change once they are there.
GRANT SELECT, INSERT ON uncertainty_budgets, combined_readings, ambient_checks, suspect_notes TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON equipment, followed_suspects, mask_recomputations TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (withdrawn_at) ON calibrations TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (archived_at) ON bench_checks TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (withdrawn_by, withdrawn_at) ON accepted_mismatches TO neap_app;
--> statement-breakpoint
GRANT UPDATE (in_force_at) ON mask_revisions TO neap_app;
--> statement-breakpoint
UPDATE mask_revisions r SET source = 'shipped', in_force_at = r.created_at
  FROM masks m WHERE m.team_id = r.team_id AND m.id = r.mask_id AND m.origin = 'shipped';
--> statement-breakpoint
UPDATE mask_revisions SET in_force_at = created_at WHERE source <> 'shipped';
