/**
 * What the app role may do with each table. Evidence tables take inserts and nothing else; no table is deleted
 * from, save the projections of a record, which are rewritten with it, drafts (a trigger keeps what was signed), a person's own saved
 * filters, sessions, and what `pruneOld` takes away.
 */
export const APP_RIGHTS: Record<string, string> = {
  accounts: 'SELECT, INSERT, UPDATE',
  account_tokens: 'SELECT, INSERT, UPDATE, DELETE',
  recovery_codes: 'SELECT, INSERT, UPDATE',
  sessions: 'SELECT, INSERT, UPDATE, DELETE',
  farms: 'SELECT, INSERT, UPDATE',
  farm_heads: 'SELECT, INSERT, UPDATE',
  season_counters: 'SELECT, INSERT, UPDATE',
  people: 'SELECT, INSERT, UPDATE',
  shared_phones: 'SELECT, INSERT, UPDATE',
  person_papers: 'SELECT, INSERT, UPDATE',
  grants: 'SELECT, INSERT, UPDATE',
  blocks: 'SELECT, INSERT, UPDATE',
  sites: 'SELECT, INSERT, UPDATE',
  ground_features: 'SELECT, INSERT, UPDATE',
  block_boundaries: 'SELECT, INSERT',
  plantings: 'SELECT, INSERT, UPDATE',
  beds: 'SELECT, INSERT, UPDATE',
  farm_events: 'SELECT, INSERT, UPDATE (withdrawn_at, withdrawn_by_id, withdrawn_reason)',
  farm_event_blocks: 'SELECT, INSERT',
  materials: 'SELECT, INSERT, UPDATE',
  lots: 'SELECT, INSERT, UPDATE',
  lot_entries: 'SELECT, INSERT',
  certificates: 'SELECT, INSERT, UPDATE',
  sprayers: 'SELECT, INSERT, UPDATE',
  calibrations: 'SELECT, INSERT, UPDATE (withdrawn_at, withdrawn_by_id, withdrawn_reason)',
  application_records: 'SELECT, INSERT, UPDATE, DELETE',
  record_lines: 'SELECT, INSERT, DELETE',
  record_components: 'SELECT, INSERT, DELETE',
  register_entries: 'SELECT, INSERT, DELETE',
  record_terms: 'SELECT, INSERT, DELETE',
  record_versions: 'SELECT, INSERT',
  record_reviews: 'SELECT, INSERT',
  attachments: 'SELECT, INSERT, UPDATE (season, signed_version, removed_at)',
  saved_filters: 'SELECT, INSERT, DELETE',
  season_plans: 'SELECT, INSERT, UPDATE',
  plan_steps: 'SELECT, INSERT, UPDATE',
  plan_jobs: 'SELECT, INSERT, UPDATE',
  plan_job_records: 'SELECT, INSERT, DELETE',
  job_digests: 'SELECT, INSERT',
  journal: 'SELECT, INSERT',
  season_heads: 'SELECT, INSERT',
  invitations: 'SELECT, INSERT, UPDATE',
  reset_asks: 'SELECT, INSERT, UPDATE, DELETE',
  letters: 'SELECT, INSERT, UPDATE (params, state, tries, next_try_at, claimed_until, sent_at, last_fault), DELETE',
  demo_seed: 'SELECT, INSERT',
}

/** Functions the app role may call that look over farm borders; each answers only what its name says. */
export const APP_FUNCTIONS = [
  'account_access(uuid, timestamptz)', 'account_grants(uuid, timestamptz)', 'account_ended_grants(uuid, timestamptz)', 'every_farm()', 'farm_asks_factor(uuid)', 'find_check_code(text)',
  'find_season_code(text)',
]
