import { Migration } from '@mikro-orm/migrations';

/** What a material's certificates say, kept with the material. */
export class MaterialFacts extends Migration {
  override up(): void {
    this.addSql("alter table material add column facts jsonb not null default '{}'");
  }
}
