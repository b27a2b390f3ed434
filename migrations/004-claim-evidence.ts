import { Migration } from '@mikro-orm/migrations';
import { houseWall } from '#server/db/house-wall.ts';

/** Papers behind a product's claims, each house behind its own wall. */
export class ClaimEvidence extends Migration {
  override up(): void {
    for (const statement of [...TABLE, ...houseWall('product_evidence')]) this.addSql(statement);
  }
}

const TABLE = [
  `create table product_evidence (
     id uuid primary key,
     house_id uuid not null,
     product_id uuid not null,
     claim text not null check (char_length(claim) <= 500),
     kind text not null,
     file_name text not null,
     media_type text not null,
     bytes int not null check (bytes > 0),
     sha256 text not null,
     storage_key text not null unique,
     dated text,
     added_at timestamptz not null,
     added_by_id uuid not null references person (id),
     added_by text not null,
     foreign key (house_id, product_id) references product (house_id, id))`,
  'create index product_evidence_product on product_evidence (house_id, product_id)',
];
