import type { MigrationInterface, QueryRunner } from 'typeorm'

/** The register's litres, kilograms and rates are what went on the land, where that was measured, and no longer the mix. */
export class CountOnLand1764653000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await overFarms(db, [EACH, ON_LAND, SPREAD, ENTRIES])
  }

  async down(db: QueryRunner): Promise<void> {
    await overFarms(db, [MIX, ENTRIES])
  }
}

/** The owner of the tables sees no farm's rows either, save while this lifts it. */
async function overFarms(db: QueryRunner, statements: readonly string[]): Promise<void> {
  const tables = ['application_records', 'register_entries']
  for (const table of tables) await db.query(`ALTER TABLE ${table} NO FORCE ROW LEVEL SECURITY`)
  for (const statement of statements) await db.query(statement)
  for (const table of tables) await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
}

/** What went on each plant or bed: of the mix, until more is known. Records of the first schema were sized by no such thing. */
const EACH = `UPDATE application_records SET register_row = register_row || jsonb_build_object('sprayPerEach',
    CASE jsonb_typeof(computed->'sprayPerEach') WHEN 'object'
      THEN jsonb_build_object('each', computed->'sprayPerEach'->'each', 'litres', trim_scale((computed->'sprayPerEach'->>'litres')::numeric)::text)
    END)`

/** Litres in one of each, kilograms in one of each: exact by definition (NIST Handbook 44, appendix C; Weights and Measures Act 1985 for the gallon of 4.54609 L). */
const MEASURES = `(VALUES ('L', 'L', 1), ('mL', 'L', 0.001), ('galUS', 'L', 3.785411784), ('qtUS', 'L', 0.946352946), ('ptUS', 'L', 0.473176473), ('cupUS', 'L', 0.2365882365),
    ('flozUS', 'L', 0.0295735295625), ('tbspUS', 'L', 0.01478676478125), ('tspUS', 'L', 0.00492892159375), ('galImp', 'L', 4.54609), ('flozImp', 'L', 0.0284130625),
    ('kg', 'kg', 1), ('g', 'kg', 0.001), ('lb', 'kg', 0.45359237), ('oz', 'kg', 0.028349523125)) AS measure (code, dimension, si)`

/** What is written on the lines of a record, all of one dimension and not all of it worked out from the mix. */
const MEASURED = `SELECT r.farm_id, r.id, min(measure.dimension) AS dimension, sum((line->'amount'->>'value')::numeric * measure.si) AS total,
    (r.computed->>'totalL')::numeric AS mix_l, (r.computed->>'totalKg')::numeric AS mix_kg, nullif((r.register_row->>'areaHa')::numeric, 0) AS area_ha
  FROM application_records r CROSS JOIN LATERAL jsonb_array_elements(r.content->'lines') AS line LEFT JOIN ${MEASURES} ON measure.code = line->'amount'->>'unit'
  GROUP BY r.farm_id, r.id
  HAVING count(*) = count(measure.code) AND count(DISTINCT measure.dimension) = 1 AND bool_or(line->'amount'->>'known' <> 'workedOut')`

const text = (value: string): string => `trim_scale(round(${value}, 12))::text`

/** A spray: what was weighed into the tank, and what each plant got, by the share of the mix that went on. */
const ON_LAND = `UPDATE application_records r SET register_row = r.register_row || jsonb_build_object(
    'totalL', ${text('m.total')}, 'sprayLPerHa', ${text('m.total / m.area_ha')},
    'totalKg', coalesce(${text('m.mix_kg * m.total / nullif(m.mix_l, 0)')}, r.register_row->>'totalKg'),
    'kgPerHa', coalesce(${text('m.mix_kg * m.total / nullif(m.mix_l, 0) / m.area_ha')}, r.register_row->>'kgPerHa'),
    'sprayPerEach', CASE jsonb_typeof(r.register_row->'sprayPerEach') WHEN 'object' THEN (r.register_row->'sprayPerEach') || jsonb_build_object(
      'litres', coalesce(${text("(r.register_row->'sprayPerEach'->>'litres')::numeric * m.total / nullif(m.mix_l, 0)")}, r.register_row->'sprayPerEach'->>'litres')) END)
  FROM (${MEASURED}) m WHERE r.farm_id = m.farm_id AND r.id = m.id AND m.dimension = 'L'`

/** What was spread dry. */
const SPREAD = `UPDATE application_records r SET register_row = r.register_row || jsonb_build_object('totalKg', ${text('m.total')}, 'kgPerHa', ${text('m.total / m.area_ha')})
  FROM (${MEASURED}) m WHERE r.farm_id = m.farm_id AND r.id = m.id AND m.dimension = 'kg' AND m.mix_l IS NULL`

const ENTRIES = `UPDATE register_entries e SET total_l = (r.register_row->>'totalL')::numeric, total_kg = coalesce((r.register_row->>'totalKg')::numeric, 0)
  FROM application_records r WHERE r.farm_id = e.farm_id AND r.id = e.record_id
    AND (e.total_l, e.total_kg) IS DISTINCT FROM ((r.register_row->>'totalL')::numeric, coalesce((r.register_row->>'totalKg')::numeric, 0))`

/** The mix again, as the record's own figures have it. */
const MIX = `UPDATE application_records SET register_row = (register_row - 'sprayPerEach') || jsonb_build_object(
    'totalL', computed->>'totalL', 'sprayLPerHa', computed->>'sprayLPerHa', 'totalKg', computed->>'totalKg', 'kgPerHa', computed->>'kgPerHa')`
