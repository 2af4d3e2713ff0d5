import { AsyncLocalStorage } from 'node:async_hooks';
import {
  createClient,
  type Client,
  type Config,
  type InArgs,
  type InStatement,
  type Transaction,
  type TransactionMode,
} from '@libsql/client';

export type SerialOptions = { maxHoldMs?: number; busyRetryMs?: number };

const NATIVE_WAIT_MS = 200;
const scope = new AsyncLocalStorage<{ open: boolean }>();

/** Marks an asynchronous flow, so that a write past its own transaction fails at once instead of waiting for itself. */
export const inTransaction = <T>(run: () => Promise<T>): Promise<T> => scope.run({ open: false }, run);

/**
 * One writer at a time in this process. After SQLITE_BUSY the pool is thrown away: the statement that
 * failed stays half-run on its connection, and later writes there are acknowledged but lost.
 */
export function createSerialClient(
  config: Config,
  { maxHoldMs = 10_000, busyRetryMs = 15_000 }: SerialOptions = {},
): Client {
  const base = createClient({ timeout: NATIVE_WAIT_MS, ...config });
  const queue = createQueue();

  const acquire = async () => {
    if (scope.getStore()?.open) throw new Error('A write past the open transaction: write through tx.');
    return queue();
  };

  const retrying = async <T>(operation: () => Promise<T>): Promise<T> => {
    const until = Date.now() + busyRetryMs;
    for (let pauseMs = 10; ; pauseMs = Math.min(pauseMs * 2, 250)) {
      try {
        return await operation();
      } catch (error) {
        if (!isBusy(error)) throw error;
        await base.reconnect();
        if (Date.now() > until) throw error;
        await new Promise((resolve) => setTimeout(resolve, pauseMs));
      }
    }
  };

  const write = async <T>(operation: () => Promise<T>): Promise<T> => {
    const release = await acquire();
    try {
      return await retrying(operation);
    } finally {
      release();
    }
  };

  const read = async <T>(operation: () => Promise<T>): Promise<T> => {
    try {
      return await operation();
    } catch (error) {
      if (!isBusy(error) || scope.getStore()?.open) throw error;
      return write(async () => {
        await base.reconnect();
        return operation();
      });
    }
  };

  const transaction = async (mode: TransactionMode = 'write'): Promise<Transaction> => {
    if (mode === 'read')
      throw new Error('Read transactions are not opened here: a reconnect would close them.');
    const release = await acquire();
    try {
      const tx = await retrying(() => base.transaction('write'));
      return hold(tx, maxHoldMs, () => base.reconnect(), release);
    } catch (error) {
      release();
      throw error;
    }
  };

  return {
    execute(statement: InStatement, args?: InArgs) {
      const sql = typeof statement === 'string' ? statement : statement.sql;
      const run = () =>
        typeof statement === 'string' ? base.execute(statement, args) : base.execute(statement);
      return /^\s*(select|explain|values)\b/i.test(sql) ? read(run) : write(run);
    },
    batch: (statements: Array<InStatement | [string, InArgs?]>) =>
      write(() => base.batch(statements, 'write')),
    migrate: (statements: InStatement[]) => write(() => base.migrate(statements)),
    executeMultiple: (sql: string) => write(() => base.executeMultiple(sql)),
    transaction,
    sync: () => base.sync(),
    reconnect: () => base.reconnect(),
    close: () => base.close(),
    get closed() {
      return base.closed;
    },
    protocol: base.protocol,
  };
}

function createQueue() {
  let tail: Promise<unknown> = Promise.resolve();
  return async (): Promise<() => void> => {
    let free: () => void = () => undefined;
    const mine = new Promise<void>((resolve) => (free = resolve));
    const before = tail;
    tail = before.then(() => mine);
    await before;
    return free;
  };
}

function hold(
  tx: Transaction,
  maxHoldMs: number,
  reconnect: () => void | Promise<void>,
  release: () => void,
): Transaction {
  const here = scope.getStore();
  if (here) here.open = true;
  const settle = () => {
    clearTimeout(timer);
    if (here) here.open = false;
    release();
  };
  const timer = setTimeout(() => {
    tx.close();
    settle();
  }, maxHoldMs);
  const ending = async (end: () => Promise<void>) => {
    try {
      await end();
    } catch (error) {
      if (isBusy(error)) await reconnect();
      throw error;
    } finally {
      settle();
    }
  };
  return {
    execute: (statement: InStatement) => tx.execute(statement),
    batch: (statements: InStatement[]) => tx.batch(statements),
    executeMultiple: (sql: string) => tx.executeMultiple(sql),
    commit: () => ending(() => tx.commit()),
    rollback: () => ending(() => tx.rollback()),
    close() {
      tx.close();
      settle();
    },
    get closed() {
      return tx.closed;
    },
  };
}

function isBusy(error: unknown): boolean {
  return (
    typeof error === 'object' && error !== null && 'code' in error && String(error.code) === 'SQLITE_BUSY'
  );
}
