/**
 * What the database itself holds of the count ledger: views without struck-out rows, the running sum in time order, and
 * the balance of splits and merges. Checked when the transaction ends, since a pair is written one line at a time.
 */
export const countRules: readonly string[] = [
  `CREATE VIEW live_count_entries AS
     SELECT e.* FROM count_entries e
      WHERE NOT EXISTS (SELECT 1 FROM animal_voids v WHERE v.count_entry_id = e.id)`,
  `CREATE VIEW live_moves AS
     SELECT m.* FROM moves m WHERE NOT EXISTS (SELECT 1 FROM animal_voids v WHERE v.move_id = m.id)`,
  `CREATE VIEW live_weights AS
     SELECT w.* FROM weights w WHERE NOT EXISTS (SELECT 1 FROM animal_voids v WHERE v.weight_id = w.id)`,
  `CREATE VIEW live_deaths AS
     SELECT d.* FROM deaths d WHERE NOT EXISTS (SELECT 1 FROM animal_voids v WHERE v.death_id = d.id)`,
  `REVOKE INSERT ON live_count_entries, live_moves, live_weights, live_deaths FROM pratique_app`,

  // At one instant arrivals stand before departures, as in shared/domain/ledger/list-running-counts.ts
  `CREATE FUNCTION check_running_count(wanted uuid) RETURNS void LANGUAGE plpgsql AS $$
   DECLARE
     lowest bigint;
     highest bigint;
     shape text;
   BEGIN
     -- Two transactions that each fit alone must not pass together: the animal's row puts them in line.
     SELECT a.form INTO shape FROM animals a WHERE a.id = wanted FOR UPDATE;
     SELECT min(s.balance), max(s.balance) INTO lowest, highest
       FROM (SELECT sum(e.delta) OVER (ORDER BY e.happened_at, e.delta < 0, e.id
                                       ROWS BETWEEN UNBOUNDED PRECEDING AND CURRENT ROW) AS balance
               FROM live_count_entries e WHERE e.animal_id = wanted) s;
     IF lowest < 0 THEN
       RAISE EXCEPTION 'the count of animal % falls to %', wanted, lowest
         USING ERRCODE = '23514', CONSTRAINT = 'ck_count_entries_running_sum', TABLE = 'count_entries';
     END IF;
     IF shape = 'individual' AND highest > 1 THEN
       RAISE EXCEPTION 'individual % counts %', wanted, highest
         USING ERRCODE = '23514', CONSTRAINT = 'ck_count_entries_individual', TABLE = 'count_entries';
     END IF;
   END $$`,
  `CREATE FUNCTION check_transfer_balance(wanted uuid) RETURNS void LANGUAGE plpgsql AS $$
   DECLARE
     sound boolean;
   BEGIN
     SELECT count(*) = 0 OR (count(*) = 2 AND sum(e.delta) = 0 AND count(DISTINCT e.animal_id) = 2
            AND count(DISTINCT e.happened_at) = 1
            AND array_agg(e.kind ORDER BY e.delta) IN (ARRAY['split-out', 'split-in'], ARRAY['merge-out', 'merge-in']))
       INTO sound FROM live_count_entries e WHERE e.transfer_id = wanted;
     IF NOT sound THEN
       RAISE EXCEPTION 'transfer % does not balance', wanted
         USING ERRCODE = '23514', CONSTRAINT = 'ck_count_entries_balanced', TABLE = 'count_entries';
     END IF;
   END $$`,

  `CREATE FUNCTION on_count_entry() RETURNS trigger LANGUAGE plpgsql AS $$
   BEGIN
     PERFORM check_running_count(NEW.animal_id);
     IF NEW.transfer_id IS NOT NULL THEN PERFORM check_transfer_balance(NEW.transfer_id); END IF;
     RETURN NULL;
   END $$`,
  `CREATE FUNCTION on_count_void() RETURNS trigger LANGUAGE plpgsql AS $$
   DECLARE
     entry count_entries%ROWTYPE;
   BEGIN
     SELECT * INTO entry FROM count_entries e WHERE e.id = NEW.count_entry_id;
     PERFORM check_running_count(entry.animal_id);
     IF entry.transfer_id IS NOT NULL THEN PERFORM check_transfer_balance(entry.transfer_id); END IF;
     RETURN NULL;
   END $$`,
  `CREATE CONSTRAINT TRIGGER tr_count_entries_running_sum AFTER INSERT ON count_entries
     DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION on_count_entry()`,
  `CREATE CONSTRAINT TRIGGER tr_animal_voids_running_sum AFTER INSERT ON animal_voids
     DEFERRABLE INITIALLY DEFERRED FOR EACH ROW WHEN (NEW.count_entry_id IS NOT NULL)
     EXECUTE FUNCTION on_count_void()`,
]
