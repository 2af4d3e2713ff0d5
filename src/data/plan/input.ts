import 'server-only';
import { z } from 'zod';
import { VERBS, type Command } from '../../schedule/commands';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { invalid } from '../errors';

const id = z.string().regex(ID_PATTERN, 'must be 16 base-32 letters');

const scan = z.strictObject({
  id,
  sourceId: id,
  modeId: id,
  startMs: z.number(),
  lengthSeconds: z.number(),
  stations: z
    .array(z.strictObject({ station: z.string().max(2), lateSeconds: z.number(), earlySeconds: z.number() }))
    .max(64),
  groupId: id.nullable(),
  leg: z.enum(['target', 'calibrator']).nullable(),
  comment: z.string().max(2000),
});

const group = z.strictObject({
  id,
  targetId: id,
  calibratorId: id,
  targetOnSeconds: z.number(),
  calibratorOnSeconds: z.number(),
  turnSeconds: z.number(),
  first: z.enum(['target', 'calibrator']),
});

const edit = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('add-scan'), scan }),
  z.strictObject({ kind: z.literal('change-scan'), scan }),
  z.strictObject({ kind: z.literal('remove-scan'), scanId: id }),
  z.strictObject({ kind: z.literal('add-group'), group }),
  z.strictObject({ kind: z.literal('change-group'), group }),
  z.strictObject({ kind: z.literal('remove-group'), groupId: id }),
  z.strictObject({
    kind: z.literal('change-span'),
    span: z.strictObject({ startMs: z.number(), lengthSeconds: z.number() }),
  }),
]);

const act = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('do'),
    actId: id,
    command: z.strictObject({ verb: z.enum(VERBS), edits: z.array(edit).max(5000) }),
    seen: z.record(z.string().max(16), z.number().int().min(0)),
  }),
  z.strictObject({ kind: z.literal('undo'), actId: id }),
  z.strictObject({ kind: z.literal('redo'), actId: id }),
]);

export type ActInput =
  | { kind: 'do'; actId: string; command: Command; seen: Record<string, number> }
  | { kind: 'undo' | 'redo'; actId: string };

/** Shape only: what a length or a station may be is `applyCommand`'s to say, in its own sentences. */
export function parseAct(body: unknown): ActInput {
  const parsed = act.safeParse(body);
  if (parsed.success) return parsed.data;
  const fields: Record<string, string[]> = {};
  for (const issue of parsed.error.issues) (fields[issue.path.join('.')] ??= []).push(issue.message);
  const [where = '', [why = ''] = []] = Object.entries(fields)[0] ?? [];
  throw invalid(`The change could not be read${where && ` at ${where}`}: ${why}.`, fields);
}
