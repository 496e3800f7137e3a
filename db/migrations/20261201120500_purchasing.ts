import type { Knex } from 'knex'

/** Who a shop buys from, and when it should. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE suppliers (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      name text NOT NULL CHECK (name = btrim(name) AND length(name) BETWEEN 1 AND 200),
      email text CHECK (length(email) <= 254),
      phone text CHECK (length(phone) <= 100),
      contact_name text CHECK (length(contact_name) <= 200),
      account_number text CHECK (length(account_number) <= 100),
      lead_time_days integer CHECK (lead_time_days BETWEEN 0 AND 3650),
      note text NOT NULL DEFAULT '' CHECK (length(note) <= 10000),
      version integer NOT NULL DEFAULT 1,
      archived_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX suppliers_name_idx ON suppliers (lower(name));
    CREATE TRIGGER suppliers_version BEFORE UPDATE ON suppliers
      FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();

    CREATE TABLE reorder_points (
      item_id bigint NOT NULL REFERENCES items,
      crib_id bigint NOT NULL REFERENCES cribs,
      reorder_point integer NOT NULL CHECK (reorder_point BETWEEN 0 AND 1000000),
      order_up_to integer NOT NULL CHECK (order_up_to BETWEEN 0 AND 1000000),
      pack_size integer NOT NULL DEFAULT 1 CHECK (pack_size BETWEEN 1 AND 1000000),
      minimum_order integer NOT NULL DEFAULT 1 CHECK (minimum_order BETWEEN 1 AND 1000000),
      supplier_id bigint REFERENCES suppliers,
      supplier_part_number text CHECK (length(supplier_part_number) <= 200),
      lead_time_days integer CHECK (lead_time_days BETWEEN 0 AND 3650),
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (item_id, crib_id),
      CONSTRAINT reorder_points_point_within_order_up_to CHECK (reorder_point <= order_up_to)
    );
    COMMENT ON COLUMN reorder_points.minimum_order IS 'the supplier takes no smaller order, in pieces';
    CREATE INDEX reorder_points_crib_id_idx ON reorder_points (crib_id, item_id);
    CREATE INDEX reorder_points_supplier_id_idx ON reorder_points (supplier_id);
    CREATE TRIGGER reorder_points_version BEFORE UPDATE ON reorder_points
      FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();
  `)
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE reorder_points, suppliers')
}
