import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createClient, type Client } from '@libsql/client';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createSerialClient, inTransaction } from '@/db/serial-client';

let folder: string;
let url: string;
let client: Client;

beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'antiphon-serial-'));
  url = `file:${path.join(folder, 'a.db')}`;
  client = createSerialClient({ url });
  await client.execute('PRAGMA journal_mode = WAL');
  await client.execute('CREATE TABLE notes (n INTEGER NOT NULL) STRICT');
});

afterEach(() => {
  client.close();
  rmSync(folder, { recursive: true });
});

const count = async () => Number((await client.execute('SELECT count(*) AS n FROM notes')).rows[0]?.n);

describe('the serial client', () => {
  it('takes a hundred parallel writes and transactions, none lost', async () => {
    await Promise.all(
      Array.from({ length: 100 }, async (_, n) => {
        if (n % 2 === 0)
          return void (await client.execute({ sql: 'INSERT INTO notes VALUES (?)', args: [n] }));
        const tx = await client.transaction('write');
        await tx.execute({ sql: 'INSERT INTO notes VALUES (?)', args: [n] });
        await new Promise((resolve) => setTimeout(resolve, 1));
        await tx.commit();
      }),
    );
    expect(await count()).toBe(100);
  });

  it('refuses a write past an open transaction at once, and the transaction goes on', async () => {
    await inTransaction(async () => {
      const tx = await client.transaction('write');
      await tx.execute('INSERT INTO notes VALUES (1)');
      await expect(client.execute('INSERT INTO notes VALUES (2)')).rejects.toThrow('write through tx');
      await expect(client.transaction('write')).rejects.toThrow('write through tx');
      await tx.commit();
    });
    expect(await count()).toBe(1);
  });

  it('lets reads through while a transaction is open, and they do not see it', async () => {
    const tx = await client.transaction('write');
    await tx.execute('INSERT INTO notes VALUES (1)');
    expect(await count()).toBe(0);
    await tx.commit();
    expect(await count()).toBe(1);
  });

  it('keeps every acknowledged write while another client holds the lock now and then', async () => {
    const other = createClient({ url, timeout: 2000 });
    const busy = (async () => {
      for (let round = 0; round < 3; round++) {
        const tx = await other.transaction('write');
        await new Promise((resolve) => setTimeout(resolve, 300));
        await tx.rollback();
        await new Promise((resolve) => setTimeout(resolve, 30));
      }
    })();
    await Promise.all(
      Array.from({ length: 30 }, (_, n) =>
        client.execute({ sql: 'INSERT INTO notes VALUES (?)', args: [n] }),
      ),
    );
    await busy;
    const seenByOther = await other.execute('SELECT count(*) AS n FROM notes');
    expect(Number(seenByOther.rows[0]?.n)).toBe(30);
    other.close();
  });

  it('rolls back a transaction that is held too long, and writes go on', async () => {
    const brief = createSerialClient({ url }, { maxHoldMs: 50 });
    const tx = await brief.transaction('write');
    await tx.execute('INSERT INTO notes VALUES (1)');
    await brief.execute('INSERT INTO notes VALUES (2)');
    await expect(tx.commit()).rejects.toThrow();
    const { rows } = await brief.execute('SELECT n FROM notes');
    expect(rows.map((row) => row.n)).toEqual([2]);
    brief.close();
  });

  it('opens no read transaction: a reconnect would close it', async () => {
    await expect(client.transaction('read')).rejects.toThrow('not opened here');
  });
});
