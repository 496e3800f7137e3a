// Written by `npm run db:types` from the migrated database; a test compares the two.

export interface AlertsRow {
  id: string
  item_id: string
  crib_id: string
  opened_at: Date
  opened_event: string
  opened_on_hand: number
  opened_position: number
  opened_reorder_point: number
  closed_at: Date | null
  closed_event: string | null
  closed_position: number | null
}

export interface AssembliesRow {
  id: string
  number: number
  name: string
  note: string
  cutter_kind: string
  holder_kind: string
  stick_out_mm: number
  gauge_length_mm: number
  tool_number: number | null
  length_offset_number: number | null
  diameter_offset_number: number | null
  machine_id: string | null
  pocket: number | null
  state: string
  stick_out_set_at: Date
  built_at: Date | null
  broken_down_at: Date | null
  created_by: string
  version: number
  archived_at: Date | null
  created_at: Date
  updated_at: Date
}

export interface AssemblyChecksRow {
  id: string
  assembly_id: string
  feature: unknown
  clearances: unknown
  kept_answer: unknown
  answer: unknown
  holds: boolean
  checked_at: Date
  created_by: string
  created_at: Date
}

export interface AssemblyFindingsRow {
  id: string
  assembly_id: string
  key: string
  code: string
  check_id: string | null
  is_fault: boolean
  detail: unknown
  movement_id: string | null
  found_at: Date
  resolved_at: Date | null
}

export interface AssemblyMeasurementsRow {
  id: string
  assembly_id: string
  gauge_length_mm: number
  diameter_mm: number | null
  expected_gauge_length_mm: number
  expected_diameter_mm: number
  source: string
  actor_id: string
  measured_at: Date
}

export interface AssemblyPartsRow {
  assembly_id: string
  kind: string
  item_id: string
  item_kind: string
  piece_id: string | null
  geometry: unknown
  home_location_id: string | null
  location_id: string | null
  condition: string | null
}

export interface AssemblyRechecksRow {
  id: string
  assembly_id: string
  movement_id: string | null
  requested_at: Date
}

export interface AuditEntriesRow {
  id: string
  actor_id: string | null
  action: string
  entity: string
  entity_id: string | null
  before: unknown
  after: unknown
  request_id: string | null
  recorded_at: Date
}

export interface BalancesRow {
  item_id: string
  location_id: string
  condition: string
  is_outside: boolean
  quantity: number
}

export interface CaughtMailsRow {
  id: string
  message_id: string | null
  recipients: string[]
  source: Buffer
  caught_at: Date
}

export interface ColletsRow {
  item_id: string
  item_kind: string
  series: string
  minimum_mm: number
  maximum_mm: number
  length_mm: number | null
  minimum_grip_mm: number | null
}

export interface CribMembersRow {
  crib_id: string
  user_id: string
  created_at: Date
}

export interface CribsRow {
  id: string
  code: string
  name: string
  time_zone: string
  version: number
  created_at: Date
  updated_at: Date
}

export interface CuttersRow {
  item_id: string
  item_kind: string
  form: string
  cutting_diameter_mm: number
  corner_radius_mm: number | null
  taper_half_angle_deg: number | null
  point_angle_deg: number | null
  tip_diameter_mm: number | null
  length_of_cut_mm: number | null
  flute_length_mm: number | null
  neck_diameter_mm: number | null
  neck_taper_half_angle_deg: number | null
  reach_length_mm: number | null
  neck_transition_angle_deg: number | null
  shank_diameter_mm: number
  overall_length_mm: number
  flute_count: number | null
  substrate: string | null
  maximum_rpm: number | null
}

export interface ExtensionSegmentsRow {
  item_id: string
  position: number
  length_mm: number
  nose_diameter_mm: number
  spindle_diameter_mm: number
}

export interface ExtensionsRow {
  item_id: string
  item_kind: string
  projection_mm: number
  bore_kind: string
  bore_series: string | null
  bore_diameter_mm: number | null
  bore_depth_mm: number | null
  minimum_grip_mm: number | null
  grip_start_mm: number | null
  shank_diameter_mm: number | null
  nut_torque_nm: number | null
}

export interface FixturesRow {
  item_id: string
  item_kind: string
  height_mm: number
}

export interface FoundChangeRowsRow {
  found_change_id: string
  item_id: string
  before: unknown
  version: number
}

export interface FoundChangesRow {
  id: string
  actor_id: string
  kind: string
  field: string
  value: unknown
  changed_at: Date
  undone_at: Date | null
}

export interface HolderSegmentsRow {
  item_id: string
  part: string
  position: number
  length_mm: number
  nose_diameter_mm: number
  spindle_diameter_mm: number
}

export interface HoldersRow {
  item_id: string
  item_kind: string
  taper: string | null
  gauge_length_mm: number
  bore_kind: string
  bore_series: string | null
  bore_diameter_mm: number | null
  bore_depth_mm: number | null
  minimum_grip_mm: number | null
  grip_start_mm: number | null
  side_lock_insertion_mm: number | null
  maximum_rpm: number | null
  nut_torque_nm: number | null
}

export interface IdempotencyKeysRow {
  actor_id: string
  route: string
  key: string
  body_hash: string
  status: number | null
  answer: unknown
  created_at: Date
}

export interface ImportMappingsRow {
  kind: string
  heading: string
  field: string | null
  unit: string | null
  updated_by: string
  created_at: Date
  updated_at: Date
}

export interface ImportRowsRow {
  import_id: string
  line: number
  outcome: string
  item_id: string | null
  cells: unknown
  field_values: unknown
  problems: unknown
  item_version: number | null
  changes: unknown
}

export interface ImportsRow {
  id: string
  kind: string
  state: string
  unit: string | null
  mapping: unknown
  rejects: string | null
  file_name: string
  file_size_bytes: string
  file_path: string | null
  encoding: string | null
  delimiter: string | null
  headings: unknown
  warnings: unknown
  rows_read: number
  rows_total: number | null
  added: number
  changed: number
  unchanged: number
  rejected_count: number
  error: string | null
  created_by: string
  created_at: Date
  updated_at: Date
  checked_at: Date | null
  ended_at: Date | null
  attempt: number
  heading_line: number | null
  warning_count: number
  decimals: string | null
  decimals_origin: string | null
  defaults: unknown
}

export interface ItemMergesRow {
  item_id: string
  kept_item_id: string
  merged_by: string
  merged_at: Date
}

export interface ItemsRow {
  id: string
  kind: string
  code: string
  maker: string | null
  part_number: string | null
  description: string
  unit_cost_minor: string | null
  is_tracked_by_piece: boolean
  version: number
  archived_at: Date | null
  created_at: Date
  updated_at: Date
  search_text: string
  search_words: string[]
}

export interface LocationsRow {
  id: string
  kind: string
  code: string
  name: string
  crib_id: string | null
  parent_id: string | null
  user_id: string | null
  is_outside: boolean
  version: number
  archived_at: Date | null
  created_at: Date
  updated_at: Date
}

export interface MachineSpindlePointsRow {
  machine_id: string
  rpm: number
  power_kw: number | null
  torque_nm: number | null
}

export interface MachinesRow {
  id: string
  code: string
  name: string
  location_id: string
  taper: string
  gauge_line_to_table_mm: number
  x_travel_mm: number | null
  y_travel_mm: number | null
  z_travel_mm: number
  spindle_nose_diameter_mm: number | null
  longest_tool_mm: number | null
  widest_tool_mm: number | null
  heaviest_tool_kg: number | null
  pocket_count: number | null
  minimum_rpm: number | null
  maximum_rpm: number
  efficiency: number
  note: string
  version: number
  archived_at: Date | null
  created_at: Date
  updated_at: Date
}

export interface MovementsRow {
  id: string
  kind: string
  item_id: string
  piece_id: string | null
  quantity: number
  from_location_id: string
  from_condition: string
  to_location_id: string
  to_condition: string
  note: string
  actor_id: string
  occurred_at: Date
  recorded_at: Date
  reverses_id: string | null
  merged_item_id: string | null
}

export interface OutboxRow {
  id: string
  kind: string
  event_id: string
  crib_id: string
  user_id: string
  recipient: string
  message_id: string
  attempts: number
  next_attempt_at: Date
  sent_at: Date | null
  last_error: string | null
  created_at: Date
}

export interface PiecesRow {
  id: string
  item_id: string
  tag: string
  location_id: string | null
  condition: string | null
  cutting_diameter_mm: number | null
  corner_radius_mm: number | null
  length_of_cut_mm: number | null
  reach_length_mm: number | null
  overall_length_mm: number | null
  runout_mm: number | null
  regrind_count: number
  note: string
  version: number
  created_at: Date
  updated_at: Date
}

export interface ReorderPointsRow {
  item_id: string
  crib_id: string
  reorder_point: number
  order_up_to: number
  pack_size: number
  minimum_order: number
  supplier_id: string | null
  supplier_part_number: string | null
  lead_time_days: number | null
  version: number
  created_at: Date
  updated_at: Date
}

export interface SavedViewsRow {
  id: string
  owner_id: string
  kind: string
  name: string
  is_shared: boolean
  query: string
  version: number
  created_at: Date
  updated_at: Date
}

export interface SearchWordsRow {
  word: string
  one_shorter: string[]
}

export interface SessionsRow {
  id: string
  token_hash: string
  user_id: string
  user_agent: string | null
  created_at: Date
  last_seen_at: Date
  expires_at: Date
  ended_at: Date | null
}

export interface SetUpFixturesRow {
  set_up_id: string
  position: number
  item_id: string
  item_kind: string
  base_mm: number
}

export interface SetUpsRow {
  id: string
  machine_id: string
  name: string
  highest_mm: number
  lowest_tip_mm: number
  retract_clearance_mm: number
  stock_width_mm: number | null
  stock_height_mm: number | null
  stock_offset_x_mm: number | null
  stock_offset_y_mm: number | null
  axis_height_mm: number | null
  chuck_radius_mm: number | null
  part_diameter_mm: number | null
  centring_error_mm: number | null
  note: string
  version: number
  created_at: Date
  updated_at: Date
}

export interface ShopSettingsRow {
  id: number
  shop_name: string
  currency: string
  length_unit: string
  decimal_comma: boolean
  shank_clearance_mm: number
  holder_clearance_mm: number
  stick_out_step_mm: number
  flute_to_grip_mm: number
  hole_tolerance_mm: number
  drill_chip_room_diameters: number
  flute_stiffness_ratio: number
  carbide_modulus_gpa: number
  steel_modulus_gpa: number
  setup_completed_at: Date | null
  demo_loaded_at: Date | null
  version: number
  created_at: Date
  updated_at: Date
  radial_force_share: number
  stick_out_caution_ratio: number
  stick_out_limit_ratio: number
  measuring_tolerance_mm: number
}

export interface SignInAttemptsRow {
  id: string
  email: string
  address: string
  succeeded: boolean
  attempted_at: Date
}

export interface StartingSpeedsRow {
  id: string
  iso_group: string
  material: string
  substrate: string
  low_m_per_min: number
  high_m_per_min: number
  source_note: string
  version: number
  created_at: Date
  updated_at: Date
}

export interface StockLevelsRow {
  item_id: string
  crib_id: string
  on_hand: number
  reserved: number
  coming: number
}

export interface SuppliersRow {
  id: string
  name: string
  email: string | null
  phone: string | null
  contact_name: string | null
  account_number: string | null
  lead_time_days: number | null
  note: string
  version: number
  archived_at: Date | null
  created_at: Date
  updated_at: Date
}

export interface UserTokensRow {
  id: string
  purpose: string
  user_id: string | null
  token_hash: string
  expires_at: Date
  used_at: Date | null
  created_by: string | null
  created_at: Date
}

export interface UsersRow {
  id: string
  email: string
  name: string
  role: string
  password_hash: string | null
  length_unit: string | null
  home_crib_id: string | null
  is_active: boolean
  version: number
  created_at: Date
  updated_at: Date
}

export interface Tables {
  alerts: AlertsRow
  assemblies: AssembliesRow
  assembly_checks: AssemblyChecksRow
  assembly_findings: AssemblyFindingsRow
  assembly_measurements: AssemblyMeasurementsRow
  assembly_parts: AssemblyPartsRow
  assembly_rechecks: AssemblyRechecksRow
  audit_entries: AuditEntriesRow
  balances: BalancesRow
  caught_mails: CaughtMailsRow
  collets: ColletsRow
  crib_members: CribMembersRow
  cribs: CribsRow
  cutters: CuttersRow
  extension_segments: ExtensionSegmentsRow
  extensions: ExtensionsRow
  fixtures: FixturesRow
  found_change_rows: FoundChangeRowsRow
  found_changes: FoundChangesRow
  holder_segments: HolderSegmentsRow
  holders: HoldersRow
  idempotency_keys: IdempotencyKeysRow
  import_mappings: ImportMappingsRow
  import_rows: ImportRowsRow
  imports: ImportsRow
  item_merges: ItemMergesRow
  items: ItemsRow
  locations: LocationsRow
  machine_spindle_points: MachineSpindlePointsRow
  machines: MachinesRow
  movements: MovementsRow
  outbox: OutboxRow
  pieces: PiecesRow
  reorder_points: ReorderPointsRow
  saved_views: SavedViewsRow
  search_words: SearchWordsRow
  sessions: SessionsRow
  set_up_fixtures: SetUpFixturesRow
  set_ups: SetUpsRow
  shop_settings: ShopSettingsRow
  sign_in_attempts: SignInAttemptsRow
  starting_speeds: StartingSpeedsRow
  stock_levels: StockLevelsRow
  suppliers: SuppliersRow
  user_tokens: UserTokensRow
  users: UsersRow
}
