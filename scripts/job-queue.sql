-- Jobs are queued inside the transaction that causes them, by roles that may not touch the queue itself.
CREATE OR REPLACE FUNCTION app_queue_job(task text, payload json) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = graphile_worker, pg_temp
AS $$ SELECT graphile_worker.add_job(task, payload, max_attempts => 12) $$;

REVOKE ALL ON FUNCTION app_queue_job(text, json) FROM PUBLIC;
GRANT EXECUTE ON FUNCTION app_queue_job(text, json) TO trymark_app, trymark_auth;

-- The worker runs jobs as itself, not as the owner.
GRANT USAGE ON SCHEMA graphile_worker TO trymark_worker;
GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA graphile_worker TO trymark_worker;
GRANT USAGE ON ALL SEQUENCES IN SCHEMA graphile_worker TO trymark_worker;
GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA graphile_worker TO trymark_worker;

DO $$
DECLARE walled record;
BEGIN
  FOR walled IN
    SELECT tablename AS name FROM pg_tables WHERE schemaname = 'graphile_worker' AND rowsecurity
  LOOP
    EXECUTE format('DROP POLICY IF EXISTS running_jobs ON graphile_worker.%I', walled.name);
    EXECUTE format('CREATE POLICY running_jobs ON graphile_worker.%I TO trymark_worker USING (true) WITH CHECK (true)', walled.name);
  END LOOP;
END $$;
