import 'server-only';
import { z } from 'zod';
import {
  fieldsOf,
  readBlock,
  writeBlock,
  type Block,
  type Typed,
  type Values,
} from '../exchange/catalogue/block';
import { invalid, Refusal } from './errors';

/** What a form sends of one block: as it is typed, and as it was when the form was opened. */
export type BlockAct = { block: string; typed: unknown; was: unknown };

const row = z.record(z.string().max(40), z.string().max(4000));
const text = z.record(z.string().max(40), z.union([z.string().max(4000), z.array(row).max(1000)]));
const act = z.strictObject({ block: z.string().max(40), typed: text, was: text });
const added = z.record(z.string().max(40), z.union([text, z.string().max(200)]));

export function parseBlockAct(body: unknown): { block: string; typed: Typed; was: Typed } {
  const parsed = act.safeParse(body);
  if (!parsed.success) throw invalid('The form could not be read. Open the page again.');
  return parsed.data;
}

/** The blocks of something new, by name, and single words beside them. */
export function parseBlocks(body: unknown): Readonly<Record<string, Typed | string>> {
  const parsed = added.safeParse(body);
  if (!parsed.success) throw invalid('The form could not be read. Open the page again.');
  return parsed.data;
}

/** The values of a block that is changed, where it still stands as its person saw it. */
export function changedValues<V, T>(
  block: Block<V, T>,
  { typed, was }: { typed: unknown; was: Typed },
  current: Values<V, T>,
): Values<V, T> {
  if (!isSame(writeBlock(block, current), was)) {
    throw new Refusal({
      ok: false,
      code: 'conflict',
      message: `“${block.title}” was changed by someone else meanwhile. Leave it as it is, look at what stands there now, and edit again.`,
    });
  }
  return valuesOf(block, typed);
}

/** The values of a block, or what is wrong with it beside each field. */
export function valuesOf<V, T>(block: Block<V, T>, typed: unknown, prefix = ''): Values<V, T> {
  const read = readBlock(block, typed);
  if (read.ok) return read.value;
  const fields = fieldsOf(read.wrong, prefix);
  const [first] = read.wrong;
  throw invalid(first ? first.message : 'Look at the form again.', fields);
}

const isSame = (a: Typed, b: Typed) => JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([name, entry]) => [name, sorted(entry)]),
  );
}
