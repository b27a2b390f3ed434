import { Migration } from '@mikro-orm/migrations';
import { houseWall } from '#server/db/house-wall.ts';

/** What was done in each house, chained entry by entry. Rows are only ever added, by whomever. */
export class Trail extends Migration {
  override up(): void {
    for (const statement of [...TABLE, ...houseWall('trail_entry')]) this.addSql(statement);
  }
}

const TABLE = [
  `create table trail_entry (
     house_id uuid not null references house (id),
     place int not null check (place >= 1),
     at timestamptz not null,
     actor_id uuid references person (id),
     actor text not null,
     act text not null,
     subject_kind text not null,
     subject_id uuid,
     subject text not null,
     product_id uuid,
     changes jsonb not null,
     record_hash text check (char_length(record_hash) = 64),
     hash_before text not null check (char_length(hash_before) = 64),
     hash text not null check (char_length(hash) = 64),
     primary key (house_id, place))`,
  'create index trail_entry_product on trail_entry (house_id, product_id, place)',
  'create index trail_entry_subject on trail_entry (house_id, subject_id, place)',
  'create trigger trail_entry_stays before update or delete on trail_entry for each row execute function refuse_change()',
  'create trigger trail_entry_is_not_emptied before truncate on trail_entry for each statement execute function refuse_change()',
];
