import { Migration } from '@mikro-orm/migrations';
import { houseWall } from '#server/db/house-wall.ts';

/** Logos and images of a house, each house behind its own wall. Their bytes lie in the object store. */
export class Pictures extends Migration {
  override up(): void {
    for (const statement of [...TABLE, ...houseWall('house_picture')]) this.addSql(statement);
  }
}

const TABLE = [
  `create table house_picture (
     id uuid primary key,
     house_id uuid not null references house (id),
     name text not null check (char_length(name) between 1 and 255),
     kind text not null check (kind in ('photo', 'drawing')),
     width double precision not null check (width > 0),
     height double precision not null check (height > 0),
     shapes jsonb not null,
     bytes int not null check (bytes > 0),
     sha256 text not null,
     -- Empty for a drawing: its shapes are all of it.
     preview_key text not null,
     plates_key text not null,
     added_at timestamptz not null,
     added_by_id uuid not null references person (id),
     added_by text not null)`,
  'create index house_picture_house on house_picture (house_id, name)',
];
