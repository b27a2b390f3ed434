import { execFileSync } from 'node:child_process';
import { readlinkSync, statSync } from 'node:fs';
import { dirname } from 'node:path';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { openCluster, type Cluster } from '#server/boot/cluster.mjs';
import { openOrm } from '#server/db/orm.ts';
import { brokenPromises, requireDurable } from '#server/db/require-durable.ts';
import { runQuery } from '#server/db/run-query.ts';
import { queryOnce } from '#tests/support/database.ts';
import { makeHome, removeHome } from '#tests/support/product.ts';

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

let home: string;
let cluster: Cluster;
beforeAll(async () => {
  home = makeHome();
  cluster = await openCluster({ home });
});
afterAll(async () => {
  await cluster.stop();
  removeHome(home);
});

/** What the product's own role finds broken. */
async function seen(): Promise<string[]> {
  const orm = await openOrm(cluster.appUrl, { max: 1 });
  try {
    return await brokenPromises(runQuery(orm));
  } finally {
    await orm.close(true);
  }
}

async function setForServer(name: string, value: string): Promise<void> {
  await queryOnce(cluster.adminUrl, `alter system set ${name} = ${value}`);
  await queryOnce(cluster.adminUrl, 'select pg_reload_conf()');
  // The reload is a signal: sessions opened before it has arrived still see the old value.
  await vi.waitFor(async () => expect(await queryOnce(cluster.adminUrl, 'select setting from pg_settings where name = $1', [name])).toEqual([{ setting: value }]), { timeout: 10_000 });
}

describe('I-03 a database that may forget what it has confirmed is refused', () => {
  test('the product\'s own cluster makes every promise', async () => {
    expect(await seen()).toEqual([]);
  });

  test.each(['fsync', 'full_page_writes', 'synchronous_commit'])('%s off is found and named with its remedy', async (name) => {
    await setForServer(name, 'off');
    const broken = await seen();
    await setForServer(name, 'on');
    expect(broken).toHaveLength(1);
    expect(broken[0]).toMatch(new RegExp(`^${name} is off: set ${name} = on`));
    expect(await seen()).toEqual([]);
  });

  test('synchronous_commit off for the product\'s role alone is found', async () => {
    await queryOnce(cluster.adminUrl, 'alter role colophon_app set synchronous_commit = off');
    expect(await seen()).toHaveLength(1);
    await queryOnce(cluster.adminUrl, 'alter role colophon_app reset synchronous_commit');
    expect(await seen()).toEqual([]);
  });

  test('commits that wait for less than a standby but for the own disk are accepted', async () => {
    await setForServer('synchronous_commit', 'local');
    expect(await seen()).toEqual([]);
    await setForServer('synchronous_commit', 'on');
  });

  test('data without checksums is found, and the start is refused in one sentence', async () => {
    const bin = dirname(readlinkSync(`/proc/${String(cluster.pid)}/exe`));
    // Its programs refuse root: run as the account that owns the data.
    const { uid, gid } = statSync(cluster.data);
    await cluster.stop();
    execFileSync(`${bin}/pg_checksums`, ['--disable', '-D', cluster.data], { ...(process.getuid?.() === 0 ? { uid, gid } : {}), cwd: '/', stdio: 'pipe' });
    cluster = await openCluster({ home });
    expect(await seen()).toEqual(['data_checksums is off: stop PostgreSQL, run pg_checksums --enable on its data folder, and start it again.']);
    const orm = await openOrm(cluster.appUrl, { max: 1 });
    await expect(requireDurable(runQuery(orm))).rejects.toThrow(/^the database does not keep what it has confirmed; data_checksums is off: .+ Then start again\.$/);
    await orm.close(true);
  });
});
