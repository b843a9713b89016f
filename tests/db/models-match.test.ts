import { readdirSync, readFileSync } from 'node:fs'
import { type Model, type ModelStatic, QueryTypes } from 'sequelize'
import { describe, expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import * as models from '@/models'

const MODELS: ModelStatic<Model>[] = Object.values(models)
/** Written by the migration runner and by the rate limiter. */
const WITHOUT_MODEL = ['migrations', 'rate_limits']

type Column = { name: string; type: string; nullable: 'YES' | 'NO' }

async function columnsOf(table: string): Promise<Column[]> {
  return sequelize.query<Column>(
    `select column_name as name, udt_name as type, is_nullable as nullable from information_schema.columns
     where table_schema = 'public' and table_name = :table order by column_name`,
    { replacements: { table }, type: QueryTypes.SELECT },
  )
}

const TYPES: Record<string, string> = {
  UUID: 'uuid',
  TEXT: 'text',
  INTEGER: 'int4',
  BIGINT: 'int8',
  DECIMAL: 'numeric',
  DATEONLY: 'date',
  DATE: 'timestamptz',
  BOOLEAN: 'bool',
  JSONB: 'jsonb',
  BLOB: 'bytea',
  ARRAY: '_text',
}

describe('every model is its table', () => {
  test.each(MODELS.map((model) => [model.name, model] as const))('%s', async (_, model) => {
    const attributes = Object.values(model.getAttributes()).map((attribute) => ({
      name: attribute.field ?? '',
      type: TYPES[(attribute.type as unknown as { key: string }).key] ?? 'unknown',
      nullable: attribute.allowNull === false || attribute.primaryKey ? 'NO' : 'YES',
    }))
    const byName = (a: { name: string }, b: { name: string }) => (a.name < b.name ? -1 : 1)
    expect(attributes.sort(byName)).toEqual((await columnsOf(model.getTableName() as string)).sort(byName))
  })
})

test('a model writes the default of the migration', async () => {
  const found = await sequelize.query<{ table: string; column: string; value: string }>(
    `select table_name as table, column_name as column, column_default as value from information_schema.columns
     where table_schema = 'public' and column_default is not null and column_default not like 'gen_random_uuid%'`,
    { type: QueryTypes.SELECT },
  )
  const plain = (value: string) => value.replace(/^'(.*)'::\w+$/, '$1')
  const inDatabase = found
    .filter(({ table }) => !WITHOUT_MODEL.includes(table))
    .map(({ table, column, value }) => `${table}.${column} ${plain(value)}`)
  const inModels = MODELS.flatMap((model) =>
    Object.values(model.getAttributes())
      .filter((each) => each.defaultValue !== undefined && each.field !== 'id')
      .map(({ field, defaultValue }) => {
        const value = typeof defaultValue === 'object' ? JSON.stringify(defaultValue) : String(defaultValue)
        return `${model.getTableName() as string}.${field} ${value}`
      }),
  )
  expect(inModels.sort()).toEqual(inDatabase.filter((line) => !line.startsWith('clock_offset.id')).sort())
})

test('every table has a model', async () => {
  const tables = await sequelize.query<{ name: string }>(
    `select table_name as name from information_schema.tables where table_schema = 'public'`,
    { type: QueryTypes.SELECT },
  )
  const known = [...MODELS.map((model) => model.getTableName() as string), ...WITHOUT_MODEL]
  expect(tables.map(({ name }) => name).sort()).toEqual(known.sort())
})

test('every column says what it means', () => {
  const silent = readdirSync('models').flatMap((file) => {
    const lines = readFileSync(`models/${file}`, 'utf8').split('\n')
    return lines
      .filter((line, at) => /^ {2}declare \w+: /.test(line) && !lines[at - 1]?.trim().startsWith('/**'))
      .map((line) => `${file}: ${line.trim()}`)
  })
  expect(silent).toEqual([])
})

test('models have no hooks, no default scopes and no computing getters', () => {
  for (const model of MODELS) {
    const options = model.options as typeof model.options & { hooks?: object; getterMethods?: object }
    expect(Object.keys(options.hooks ?? {}), model.name).toEqual([])
    expect(Object.keys(options.defaultScope ?? {}), model.name).toEqual([])
    const computing = Object.values(model.getAttributes()).filter((each) => each.get || each.set)
    expect(computing, model.name).toEqual([])
  }
})
