import type { Knex } from 'knex'

/** The shop's own table of starting speeds, begun with published ranges. Where each came from stands beside it. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE starting_speeds (
      id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
      iso_group text NOT NULL CHECK (iso_group IN ('P', 'M', 'K', 'N', 'S', 'H')),
      material text NOT NULL CHECK (material = btrim(material) AND length(material) BETWEEN 1 AND 200),
      substrate text NOT NULL CHECK (substrate IN ('carbide', 'hss')),
      low_m_per_min double precision NOT NULL CHECK (low_m_per_min > 0 AND low_m_per_min <= 10000),
      high_m_per_min double precision NOT NULL CHECK (high_m_per_min > 0 AND high_m_per_min <= 10000),
      source_note text NOT NULL DEFAULT '' CHECK (length(source_note) <= 1000),
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT starting_speeds_low_within_high CHECK (low_m_per_min <= high_m_per_min)
    );
    COMMENT ON COLUMN starting_speeds.iso_group IS 'of the workpiece, after ISO 513';
    CREATE UNIQUE INDEX starting_speeds_material_idx ON starting_speeds (iso_group, lower(material), substrate);
    CREATE TRIGGER starting_speeds_version BEFORE UPDATE ON starting_speeds
      FOR EACH ROW WHEN (OLD.* IS DISTINCT FROM NEW.*) EXECUTE FUNCTION raise_version();
  `)
  await knex('starting_speeds').insert(published.map(toRow))
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE starting_speeds')
}

type Published = [group: string, material: string, substrate: string, low: number, high: number, note: string]

function toRow([iso_group, material, substrate, low_m_per_min, high_m_per_min, source_note]: Published) {
  return { iso_group, material, substrate, low_m_per_min, high_m_per_min, source_note }
}

const observatory = "an observatory workshop's table (an upper limit, it says)"
const manual = "a milling machine's manual"
const college = "a technical college's table"
const maker = (groups: string) => `A maker’s catalogue of coated solid carbide, 2022, ${groups}`

/** As test/reference/speeds/starting-speeds.md has them. */
const published: Published[] = [
  [
    'P',
    'Mild and low-carbon steel',
    'hss',
    24,
    37,
    `80 to 120 SFM: ${observatory}; ${manual} (90); ${college}.`,
  ],
  [
    'P',
    'Mild and low-carbon steel',
    'carbide',
    200,
    300,
    `A maker’s catalogue of coated solid carbide, 2022: 210 to 300 below 0.25 % C, else 200 to 250.`,
  ],
  ['P', 'Medium carbon steel, 190 to 280 HB', 'hss', 12, 21, `40 to 70 SFM: ${college}.`],
  ['P', 'Medium carbon steel, 190 to 280 HB', 'carbide', 140, 250, `${maker('carbon steels')}.`],
  [
    'P',
    'Alloy steel, 175 to 325 HB',
    'hss',
    11,
    24,
    `35 to 80 SFM: ${college} (its columns were aligned by reading order); ${observatory} (50 to 60); ${manual} (40, hard).`,
  ],
  ['P', 'Alloy steel, 175 to 325 HB', 'carbide', 120, 240, `${maker('groups 6 to 9')}.`],
  ['P', 'Tool steel', 'hss', 12, 24, `40 to 80 SFM: ${manual} (50); ${college}.`],
  ['P', 'Tool steel, annealed', 'carbide', 130, 200, `${maker('group 10')}.`],
  ['P', 'Tool steel, quenched and tempered', 'carbide', 70, 130, `${maker('group 11')}.`],
  ['M', 'Austenitic stainless steel', 'hss', 12, 18, `40 to 60 SFM: ${manual} (60); ${college} (40 to 50).`],
  ['M', 'Austenitic stainless steel', 'carbide', 60, 110, `${maker('group 14')}.`],
  ['M', 'Ferritic and martensitic stainless steel', 'hss', 15, 21, `50 to 70 SFM: ${college}.`],
  ['M', 'Ferritic and martensitic stainless steel', 'carbide', 60, 175, `${maker('groups 12 and 13')}.`],
  [
    'K',
    'Grey iron',
    'hss',
    15,
    43,
    `50 to 140 SFM: ${manual} (50 to 80); ${observatory} (60 to 80); ${college}.`,
  ],
  ['K', 'Grey iron', 'carbide', 150, 275, `${maker('groups 15 and 16')}.`],
  ['K', 'Nodular iron', 'carbide', 90, 200, `${maker('groups 17 and 18')}.`],
  [
    'N',
    'Aluminium',
    'hss',
    46,
    91,
    `150 to 300 SFM: ${manual} and ${observatory} (300); ${college} (140 to 300).`,
  ],
  ['N', 'Aluminium', 'carbide', 240, 460, 'From memory, 800 to 1500 SFM: no page was found for it.'],
  [
    'N',
    'Brass and bronze',
    'hss',
    46,
    91,
    `150 to 300 SFM: ${manual} (150); ${college}; ${observatory} (bronze 150, brass 600 and more: two values for brass differ by four).`,
  ],
  ['N', 'Brass and bronze', 'carbide', 240, 460, 'From memory, 800 to 1500 SFM: no page was found for it.'],
  ['S', 'Titanium', 'hss', 9, 18, `30 to 60 SFM: ${manual} (50); the low end is from memory.`],
  ['S', 'Titanium', 'carbide', 60, 90, `${maker('groups 36 and 37')}.`],
  ['S', 'Nickel and cobalt alloys', 'hss', 3, 8, 'From memory, 10 to 25 SFM: no page was found for it.'],
  [
    'S',
    'Nickel and cobalt alloys',
    'carbide',
    20,
    35,
    `${maker('groups 31 to 35')}. Its 60 to 90 for cast alloys is suspect and left out.`,
  ],
  [
    'H',
    'Hardened steel, 45 to 60 HRC',
    'carbide',
    40,
    80,
    `${maker('group 38, for 55 HRC')}. High-speed steel is not used.`,
  ],
]
