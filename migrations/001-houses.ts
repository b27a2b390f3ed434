import { Migration } from '@mikro-orm/migrations';
import { houseWall } from '#server/db/house-wall.ts';

/** Houses, people, materials and products, each house behind its own wall. Written by hand for the wall's sake. */
export class Houses extends Migration {
  override up(): void {
    for (const statement of TABLES) this.addSql(statement);
    this.addSql(REVISIONS_STAY);
    for (const statement of WALLS) this.addSql(statement);
  }
}

const TABLES = [
  'create extension if not exists pg_trgm',
  `create table house (
     id uuid primary key,
     version int not null default 1 check (version >= 1),
     name text not null check (char_length(name) between 1 and 255),
     brand text not null,
     particulars jsonb not null,
     created_at timestamptz not null)`,
  `create table person (
     id uuid primary key,
     issuer text not null,
     subject text not null,
     name text not null,
     email text not null,
     created_at timestamptz not null,
     constraint person_issuer_subject unique (issuer, subject))`,
  `create table membership (
     house_id uuid not null references house (id),
     person_id uuid not null references person (id),
     roles text[] not null check (roles <@ array['owner', 'formulator', 'assessor', 'artworker', 'seller']),
     primary key (house_id, person_id))`,
  'create index membership_person on membership (person_id)',
  `create table material (
     id uuid primary key,
     house_id uuid not null references house (id),
     version int not null default 1 check (version >= 1),
     trade_name text not null,
     supplier text not null,
     declare_as text not null check (declare_as in ('ingredients', 'parfum', 'aroma')),
     composition jsonb not null,
     constituents jsonb not null,
     price_per_kg numeric check (price_per_kg >= 0),
     currency text not null,
     notes text not null,
     handling jsonb not null,
     search_text text not null,
     archived boolean not null default false,
     saved_at timestamptz not null,
     saved_by_id uuid not null references person (id),
     saved_by text not null,
     -- What other tables refer to, so that no row can point into another house.
     constraint material_in_house unique (house_id, id))`,
  `create table material_document (
     id uuid primary key,
     house_id uuid not null,
     material_id uuid not null,
     kind text not null,
     file_name text not null,
     media_type text not null,
     bytes int not null check (bytes > 0),
     sha256 text not null,
     storage_key text not null unique,
     dated text,
     runs_out text,
     added_at timestamptz not null,
     added_by_id uuid not null references person (id),
     added_by text not null,
     foreign key (house_id, material_id) references material (house_id, id))`,
  'create index material_document_material on material_document (house_id, material_id)',
  `create table product (
     id uuid primary key,
     house_id uuid not null references house (id),
     version int not null default 1 check (version >= 1),
     name text not null,
     markets text[] not null,
     draft jsonb not null,
     search_text text not null,
     archived boolean not null default false,
     saved_at timestamptz not null,
     saved_by_id uuid not null references person (id),
     saved_by text not null,
     constraint product_in_house unique (house_id, id))`,
  `create table product_material (
     product_id uuid not null,
     material_id uuid not null,
     house_id uuid not null,
     primary key (product_id, material_id),
     foreign key (house_id, product_id) references product (house_id, id),
     foreign key (house_id, material_id) references material (house_id, id))`,
  'create index product_material_material on product_material (house_id, material_id)',
  `create table product_revision (
     product_id uuid not null,
     version int not null,
     house_id uuid not null,
     draft jsonb not null,
     saved_at timestamptz not null,
     saved_by_id uuid not null references person (id),
     saved_by text not null,
     primary key (product_id, version),
     foreign key (house_id, product_id) references product (house_id, id))`,
];

/** A saved revision is a record: nobody changes it, the owner of the tables included. */
const REVISIONS_STAY = `
  create function refuse_change() returns trigger language plpgsql as $$
  begin
    raise exception 'rows of % are only ever added', tg_table_name using errcode = 'restrict_violation';
  end $$;
  create trigger product_revision_stays before update or delete on product_revision for each row execute function refuse_change();
  create trigger product_revision_is_not_emptied before truncate on product_revision for each statement execute function refuse_change();`;

const THIS_HOUSE = "nullif(current_setting('app.house', true), '')::uuid";
const THIS_PERSON = "nullif(current_setting('app.person', true), '')::uuid";

const WALLS = [
  ...['material', 'material_document', 'product', 'product_material', 'product_revision'].flatMap((table) => houseWall(table)),
  // A person who signs in has no house yet: she sees her own memberships and their houses.
  ...houseWall('membership', { seenBy: `house_id = ${THIS_HOUSE} or person_id = ${THIS_PERSON}` }),
  ...houseWall('house', {
    seenBy: `id = ${THIS_HOUSE} or exists (select 1 from membership m where m.house_id = house.id and m.person_id = ${THIS_PERSON})`,
    writtenBy: `id = ${THIS_HOUSE}`,
  }),
];
