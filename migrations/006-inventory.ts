import { Migration } from '@mikro-orm/migrations';
import { houseWall } from '#server/db/house-wall.ts';

/** Names that a house took over from the official inventory, and the work of taking them over. */
export class Inventory extends Migration {
  override up(): void {
    for (const statement of TABLES) this.addSql(statement);
    for (const table of ['inventory_import', 'inventory_chunk', 'inventory_name']) for (const statement of houseWall(table)) this.addSql(statement);
  }
}

const TABLES = [
  `create table inventory_import (
     id uuid primary key,
     house_id uuid not null references house (id) on delete cascade,
     file_name text not null check (char_length(file_name) <= 255),
     started_at timestamptz not null,
     started_by text not null,
     total int not null,
     done int not null default 0,
     added int not null default 0,
     updated int not null default 0,
     unchanged int not null default 0,
     joined int not null default 0,
     skipped jsonb not null,
     remarks jsonb not null)`,
  // A house has one at a time: the last one, running or done.
  'create unique index inventory_import_house on inventory_import (house_id)',
  // What is still to be taken over: a piece is removed in the transaction that writes its names.
  `create table inventory_chunk (
     import_id uuid not null references inventory_import (id) on delete cascade,
     house_id uuid not null references house (id) on delete cascade,
     at int not null,
     names jsonb not null,
     primary key (import_id, at))`,
  `create table inventory_name (
     house_id uuid not null references house (id) on delete cascade,
     folded text not null,
     inci text not null check (char_length(inci) between 1 and 2000),
     cas text[] not null,
     ec text[] not null,
     functions text[] not null,
     search text not null,
     hash text not null,
     -- A long name does not fit into an index; its digest does.
     folded_md5 text not null generated always as (md5(folded)) stored,
     primary key (house_id, folded_md5))`,
];
