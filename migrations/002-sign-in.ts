import { Migration } from '@mikro-orm/migrations';
import { AUTH_TABLES } from '#server/auth/schema.sql.ts';

/** Sessions and sign-ins under way. */
export class SignIn extends Migration {
  override up(): void {
    for (const statement of AUTH_TABLES) this.addSql(statement);
  }
}
