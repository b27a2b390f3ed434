import { Migration } from '@mikro-orm/migrations';
import { DICTIONARY_TABLES } from '#server/modules/dictionary/schema.sql.ts';

/** The dictionary: everyone's rows, and room for a house's own. */
export class DictionaryTables extends Migration {
  override up(): void {
    for (const statement of DICTIONARY_TABLES) this.addSql(statement);
    for (const statement of WALL) this.addSql(statement);
  }
}

const OWN = "house_id = nullif(current_setting('app.house', true), '')::uuid";

/** Everyone reads the common rows; a house writes its own alone; the tables' owner keeps the common ones. */
const WALL = [
  'alter table dictionary_entry enable row level security',
  'alter table dictionary_entry force row level security',
  `create policy dictionary_entry_seen on dictionary_entry for select using (house_id is null or ${OWN})`,
  `create policy dictionary_entry_house on dictionary_entry using (${OWN}) with check (${OWN})`,
  'create policy dictionary_entry_common on dictionary_entry to current_user using (house_id is null) with check (house_id is null)',
];
