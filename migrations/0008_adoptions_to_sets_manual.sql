-- Written by hand: an adoption rests on a set of results from now on, and each one so far on the one that it named. Row-level
-- security is forced on the owner too, and rows of every organisation move: it is lifted from the owner for this step alone.
ALTER TABLE adoptions NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adoption_results NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE result_states NO FORCE ROW LEVEL SECURITY;--> statement-breakpoint
INSERT INTO adoption_results (organisation_id, adoption_id, variant_id, result_id)
  SELECT organisation_id, id, variant_id, result_id FROM adoptions WHERE result_id IS NOT NULL
  ON CONFLICT (organisation_id, adoption_id, result_id) DO NOTHING;--> statement-breakpoint
-- Whoever adopted a result had looked it through.
INSERT INTO result_states (organisation_id, result_id, state, comment, set_by, set_at)
  SELECT DISTINCT ON (organisation_id, result_id) organisation_id, result_id, 'checked', coalesce(comment, 'Adopted'),
    adopted_by, adopted_at
  FROM adoptions WHERE result_id IS NOT NULL ORDER BY organisation_id, result_id, adopted_at;--> statement-breakpoint
ALTER TABLE result_states FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adoption_results FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE adoptions FORCE ROW LEVEL SECURITY;
