import type { Knex } from 'knex'

/**
 * What fell to its reorder point, and the mails that tell of it. Both are written by triggers once a statement, in the
 * transaction that moved the stock or the point, under the lock of the stock level.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(tables)
  await knex.raw(functions)
  await knex.raw(triggers)
  await knex.raw(startingState)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER items_archived_alerts ON items;
    DROP TRIGGER stock_levels_alerts ON stock_levels;
    DROP TRIGGER reorder_points_stay ON reorder_points;
    DROP TRIGGER reorder_points_added_alerts ON reorder_points;
    DROP TRIGGER reorder_points_changed_alerts ON reorder_points;
    DROP TRIGGER reorder_points_removed_alerts ON reorder_points;
    DROP TABLE caught_mails, outbox, alerts;
    DROP FUNCTION refuse_moving_reorder_point(), keep_alerts_of_item(), keep_alerts(), alert_event(),
      write_low_stock_mails(bigint);
    DROP SEQUENCE alert_events;
  `)
}

const tables = `
  CREATE SEQUENCE alert_events;

  CREATE TABLE alerts (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    item_id bigint NOT NULL REFERENCES items,
    crib_id bigint NOT NULL REFERENCES cribs,
    opened_at timestamptz NOT NULL DEFAULT now(),
    opened_event bigint NOT NULL,
    opened_on_hand integer NOT NULL,
    opened_position integer NOT NULL,
    opened_reorder_point integer NOT NULL,
    closed_at timestamptz,
    closed_event bigint,
    closed_position integer,
    CONSTRAINT alerts_closed_whole CHECK (num_nulls(closed_at, closed_event, closed_position) IN (0, 3)),
    CONSTRAINT alerts_opened_when_low CHECK (opened_position <= opened_reorder_point)
  );
  COMMENT ON COLUMN alerts.opened_event IS 'what one transaction opens is one event, and one mail tells of it';
  COMMENT ON COLUMN alerts.closed_position IS 'above the reorder point, unless that was taken away or the item archived';
  CREATE UNIQUE INDEX alerts_one_open_idx ON alerts (crib_id, item_id) WHERE closed_at IS NULL;
  CREATE INDEX alerts_item_id_crib_id_idx ON alerts (item_id, crib_id, id);
  CREATE INDEX alerts_opened_event_idx ON alerts (opened_event, crib_id);
  CREATE TRIGGER alerts_guarded BEFORE INSERT OR UPDATE OR DELETE OR TRUNCATE ON alerts
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_direct_change();

  CREATE TABLE outbox (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    kind text NOT NULL CHECK (kind IN ('low_stock')),
    event_id bigint NOT NULL,
    crib_id bigint NOT NULL REFERENCES cribs,
    user_id bigint NOT NULL REFERENCES users,
    recipient text NOT NULL CHECK (length(recipient) BETWEEN 3 AND 254),
    message_id text NOT NULL UNIQUE DEFAULT '<' || gen_random_uuid() || '@mail.leadline.internal>',
    attempts integer NOT NULL DEFAULT 0 CHECK (attempts >= 0),
    next_attempt_at timestamptz NOT NULL DEFAULT now(),
    sent_at timestamptz,
    last_error text CHECK (length(last_error) <= 2000),
    created_at timestamptz NOT NULL DEFAULT now(),
    CONSTRAINT outbox_one_of_event_and_person UNIQUE (kind, event_id, crib_id, user_id)
  );
  COMMENT ON COLUMN outbox.message_id IS 'stays the same however often it is tried';
  CREATE INDEX outbox_due_idx ON outbox (next_attempt_at, id) WHERE sent_at IS NULL;
  CREATE INDEX outbox_user_id_idx ON outbox (user_id);
  CREATE INDEX outbox_crib_id_idx ON outbox (crib_id);

  CREATE TABLE caught_mails (
    id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    message_id text,
    recipients text[] NOT NULL,
    source bytea NOT NULL,
    caught_at timestamptz NOT NULL DEFAULT now()
  );
  COMMENT ON TABLE caught_mails IS 'what came to the catcher, which takes the mail where no mail server is set';
`

/**
 * Each touched pair of item and crib, with whether it is low and which alert of it is open. The touched rows lead and
 * all else is looked up by key, as in the books: a connection keeps these plans for one row and for a hundred thousand.
 */
const stateOf = (touched: string) => `(
      SELECT pair.item_id, pair.crib_id, level.on_hand, level.on_hand - level.reserved + level.coming AS position,
        kept.reorder_point, open_alert.id AS open_id, open_alert.opened_event,
        coalesce(level.on_hand - level.reserved + level.coming <= kept.reorder_point AND item.archived_at IS NULL, false)
          AS is_low
      FROM ${touched} AS pair
      CROSS JOIN LATERAL (SELECT archived_at FROM items WHERE id = pair.item_id OFFSET 0) AS item
      CROSS JOIN LATERAL (SELECT on_hand, reserved, coming FROM stock_levels
        WHERE (item_id, crib_id) = (pair.item_id, pair.crib_id) OFFSET 0) AS level
      LEFT JOIN LATERAL (SELECT reorder_point FROM reorder_points
        WHERE (item_id, crib_id) = (pair.item_id, pair.crib_id) OFFSET 0) AS kept ON true
      LEFT JOIN LATERAL (SELECT id, opened_event FROM alerts
        WHERE (item_id, crib_id) = (pair.item_id, pair.crib_id) AND closed_at IS NULL OFFSET 0) AS open_alert ON true
    ) AS state`

/**
 * Locks the levels of the touched pairs, making those that are missing. Items are locked before levels, as a movement's
 * foreign keys and archiving do.
 */
const lockLevels = (touched: string) => `
    PERFORM FROM items WHERE id = ANY (ARRAY(SELECT item_id FROM ${touched} AS pair)) ORDER BY id FOR KEY SHARE;
    INSERT INTO stock_levels AS level (item_id, crib_id)
      SELECT item_id, crib_id FROM ${touched} AS pair ORDER BY 1, 2
      ON CONFLICT (item_id, crib_id) DO UPDATE SET on_hand = level.on_hand WHERE false;`

/**
 * What one transaction opens and closes again, or closes and opens again, never happened. Alerts are picked by arrays of
 * ids, so that no plan can lead with the alerts and go through the touched rows for each.
 */
const settle = (touched: string) => `
    IF NOT EXISTS (SELECT FROM ${stateOf(touched)} WHERE is_low <> (open_id IS NOT NULL)) THEN
      RETURN NULL;
    END IF;
    event := alert_event();

    DELETE FROM alerts WHERE id = ANY (ARRAY(
      SELECT open_id FROM ${stateOf(touched)} WHERE NOT is_low AND opened_event = event));
    UPDATE alerts SET closed_at = now(), closed_event = event, closed_position = (
        SELECT on_hand - reserved + coming FROM stock_levels
        WHERE (item_id, crib_id) = (alerts.item_id, alerts.crib_id))
      WHERE id = ANY (ARRAY(SELECT open_id FROM ${stateOf(touched)} WHERE NOT is_low AND open_id IS NOT NULL));
    UPDATE alerts SET closed_at = NULL, closed_event = NULL, closed_position = NULL
      WHERE id = ANY (ARRAY(
        SELECT again.id FROM ${stateOf(touched)}
        CROSS JOIN LATERAL (SELECT id FROM alerts
          WHERE (item_id, crib_id) = (state.item_id, state.crib_id) AND closed_event = event OFFSET 0) AS again
        WHERE state.is_low AND state.open_id IS NULL));
    INSERT INTO alerts (item_id, crib_id, opened_event, opened_on_hand, opened_position, opened_reorder_point)
      SELECT item_id, crib_id, event, on_hand, position, reorder_point
      FROM ${stateOf(touched)}
      WHERE is_low AND open_id IS NULL
      ORDER BY item_id, crib_id;
    PERFORM write_low_stock_mails(event);
    RETURN NULL;`

const steadyPlans = `SET enable_seqscan = off SET enable_hashjoin = off SET enable_mergejoin = off SET jit = off`

const functions = `
  -- The number of this transaction among those that opened or closed alerts.
  CREATE FUNCTION alert_event() RETURNS bigint LANGUAGE plpgsql AS $$
  DECLARE
    event bigint := nullif(current_setting('leadline.alert_event', true), '')::bigint;
  BEGIN
    IF event IS NULL THEN
      event := nextval('alert_events');
      PERFORM set_config('leadline.alert_event', event::text, true);
    END IF;
    RETURN event;
  END $$;

  -- One mail for each crib and member, however much went low at once. A crib without members writes to whoever keeps
  -- cribs, so that somebody hears.
  CREATE FUNCTION write_low_stock_mails(event bigint) RETURNS void LANGUAGE plpgsql AS $$
  BEGIN
    INSERT INTO outbox (kind, event_id, crib_id, user_id, recipient)
      SELECT 'low_stock', event, crib.id, users.id, users.email
      FROM (SELECT DISTINCT crib_id AS id FROM alerts WHERE opened_event = event) AS crib
      JOIN users ON users.is_active AND CASE
        WHEN EXISTS (SELECT FROM crib_members JOIN users AS member ON member.id = user_id AND member.is_active
          WHERE crib_id = crib.id)
        THEN EXISTS (SELECT FROM crib_members WHERE crib_id = crib.id AND user_id = users.id)
        ELSE users.role IN ('crib_manager', 'admin')
      END
      ORDER BY crib.id, users.id
      ON CONFLICT ON CONSTRAINT outbox_one_of_event_and_person DO NOTHING;
    DELETE FROM outbox WHERE kind = 'low_stock' AND event_id = event
      AND NOT EXISTS (SELECT FROM alerts WHERE opened_event = event AND alerts.crib_id = outbox.crib_id);
  END $$;

  CREATE FUNCTION keep_alerts() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  DECLARE
    event bigint;
  BEGIN
    IF TG_TABLE_NAME = 'reorder_points' THEN ${lockLevels('touched')}
    END IF;
    ${settle('touched')}
  END $$;

  CREATE FUNCTION keep_alerts_of_item() RETURNS trigger LANGUAGE plpgsql ${steadyPlans} AS $$
  DECLARE
    event bigint;
  BEGIN
    ${lockLevels('(SELECT item_id, crib_id FROM reorder_points WHERE item_id = NEW.id)')}
    ${settle('(SELECT item_id, crib_id FROM reorder_points WHERE item_id = NEW.id)')}
  END $$;

  -- LL017: its alerts were kept by what it is of.
  CREATE FUNCTION refuse_moving_reorder_point() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    RAISE EXCEPTION 'a reorder point keeps its item and its crib' USING
      ERRCODE = 'LL017', TABLE = 'reorder_points', CONSTRAINT = 'reorder_points_keep_item_and_crib';
  END $$;
`

const triggers = `
  -- A level is made at nothing and then changed, and where there is a reorder point it was made with that.
  CREATE TRIGGER stock_levels_alerts AFTER UPDATE ON stock_levels REFERENCING NEW TABLE AS touched
    FOR EACH STATEMENT EXECUTE FUNCTION keep_alerts();
  CREATE TRIGGER reorder_points_added_alerts AFTER INSERT ON reorder_points REFERENCING NEW TABLE AS touched
    FOR EACH STATEMENT EXECUTE FUNCTION keep_alerts();
  CREATE TRIGGER reorder_points_changed_alerts AFTER UPDATE ON reorder_points REFERENCING NEW TABLE AS touched
    FOR EACH STATEMENT EXECUTE FUNCTION keep_alerts();
  CREATE TRIGGER reorder_points_removed_alerts AFTER DELETE ON reorder_points REFERENCING OLD TABLE AS touched
    FOR EACH STATEMENT EXECUTE FUNCTION keep_alerts();
  CREATE TRIGGER reorder_points_stay BEFORE UPDATE ON reorder_points
    FOR EACH ROW WHEN ((OLD.item_id, OLD.crib_id) IS DISTINCT FROM (NEW.item_id, NEW.crib_id))
    EXECUTE FUNCTION refuse_moving_reorder_point();
  CREATE TRIGGER items_archived_alerts AFTER UPDATE OF archived_at ON items
    FOR EACH ROW WHEN ((OLD.archived_at IS NULL) <> (NEW.archived_at IS NULL))
    EXECUTE FUNCTION keep_alerts_of_item();
`

/** What is low already stands in the list; nothing fell just now, so no mail says so. */
const startingState = `
  UPDATE reorder_points SET reorder_point = reorder_point;
  DELETE FROM outbox;
`
