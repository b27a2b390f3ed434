const THIS_HOUSE = "house_id = nullif(current_setting('app.house', true), '')::uuid";

/**
 * The statements that put a table behind its house's wall: row-level security enabled and
 * forced, rows seen and written only in the house that the transaction has set. Later
 * migrations use it for their own tables.
 */
export function houseWall(table: string, rule: { readonly seenBy?: string; readonly writtenBy?: string } = {}): string[] {
  return [
    `alter table ${table} enable row level security`,
    `alter table ${table} force row level security`,
    `create policy ${table}_house on ${table} using (${rule.seenBy ?? THIS_HOUSE}) with check (${rule.writtenBy ?? THIS_HOUSE})`,
  ];
}
