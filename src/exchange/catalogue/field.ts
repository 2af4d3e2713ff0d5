export type Read<T> =
  | { ok: true; value: T }
  /** what is wrong, what is wanted; `mend` is the likely right text */
  | { ok: false; message: string; mend?: string };

/** A value that people type as text. */
export type Field<T> = {
  label: string;
  unit?: string;
  help?: string;
  /** 'area' is text of several lines, 'list' the rows of a table */
  kind: 'text' | 'area' | 'choice';
  choices?: readonly { value: string; label: string }[];
  read(text: string): Read<T>;
  write(value: T): string;
  /** what was read, in its other form */
  echo?(value: T): string;
};

type Words = { label: string; unit?: string; help?: string };

type Limits = {
  min?: number;
  max?: number;
  above?: number;
  below?: number;
  isWhole?: boolean;
  /** stored = typed × scale */
  scale?: number;
};

/** At most this much of anything that is typed; the rest would be no name and no number. */
const LONGEST = 200;

/**
 * A number in its unit.
 *
 * @returns reads a decimal comma, spaces, U+2212 and exponents; out of its limits it says them, and offers the number
 *          with its point moved where that fits
 */
export function numberField(words: Words & Limits): Field<number> {
  return {
    label: words.label,
    unit: words.unit,
    help: words.help,
    kind: 'text',
    read: (text) =>
      text.trim() === '' ? refuse(`Type a number for “${words.label}”.`) : readNumber(text, words),
    write: (value) => numberOut(value, words.scale),
  };
}

/** A number that may be left out: null. */
export function optionalNumberField(words: Words & Limits): Field<number | null> {
  return {
    label: words.label,
    unit: words.unit,
    help: words.help,
    kind: 'text',
    read: (text) => (text.trim() === '' ? { ok: true, value: null } : readNumber(text, words)),
    write: (value) => (value === null ? '' : numberOut(value, words.scale)),
  };
}

/** A line of text; one that is needed refuses to be empty. */
export function textField(words: Words & { isNeeded?: boolean; longest?: number }): Field<string> {
  return textOf({ ...words, kind: 'text', longest: words.longest ?? LONGEST });
}

/** Text of several lines. */
export function areaField(words: Words & { longest?: number }): Field<string> {
  return textOf({ ...words, kind: 'area', longest: words.longest ?? 2000 });
}

/** One of few. */
export function choiceField<T extends string>(
  words: Words & { choices: readonly { value: T; label: string }[] },
): Field<T> {
  return {
    ...words,
    kind: 'choice',
    read: (text) => {
      const found = words.choices.find(({ value }) => value === text);
      if (found) return { ok: true, value: found.value };
      return refuse(
        `Choose one for “${words.label}”: ${words.choices.map(({ label }) => label).join(', ')}.`,
      );
    },
    write: (value) => value,
  };
}

/** A field whose text another reader turns into its value. */
export function readField<T>(
  words: Words,
  read: (text: string) => Read<T>,
  write: (value: T) => string,
  echo?: (value: T) => string,
): Field<T> {
  return { ...words, kind: 'text', read, write, ...(echo && { echo }) };
}

/** The same, for a value that cannot be left out. */
export const neededField: typeof readField = (words, read, write, echo) =>
  readField(
    words,
    (text) => (text.trim() === '' ? refuse(`“${words.label}” is empty. Type it.`) : read(text)),
    write,
    echo,
  );

/** A refusal as a value. */
export const refuse = (message: string, mend?: string): { ok: false; message: string; mend?: string } => ({
  ok: false,
  message,
  ...(mend !== undefined && { mend }),
});

/**
 * A number as people type it.
 *
 * @returns null where it is none: "1 023,5", "−6.9" and "2e-14" are
 */
export function numberIn(text: string): number | null {
  const plain = text
    .trim()
    .replaceAll('\u2212', '-')
    .replaceAll(/[\s\u2009\u202f]/g, '')
    .replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}

/** A number as a field and a file write it: ASCII, no thousands mark, no noise of binary fractions. */
export const numberOut = (value: number, scale = 1): string =>
  String(Number((value / scale).toPrecision(14)));

function readNumber(text: string, words: Words & Limits): Read<number> {
  const typed = text.trim().slice(0, 40);
  const value = numberIn(text);
  if (value === null) return refuse(`“${typed}” is no number. Type it in digits, for example 12.5.`);
  if (!fits(value, words)) {
    const mend = movedPoint(value, words);
    const question = mend === undefined ? '' : ' Is the point in the wrong place?';
    return refuse(`${typed} is out of range. ${limitsText(words)}${question}`, mend);
  }
  // the product of a decimal and its scale, freed of the noise of binary fractions
  return { ok: true, value: Number((value * (words.scale ?? 1)).toPrecision(15)) };
}

function fits(value: number, { min, max, above, below, isWhole }: Limits): boolean {
  return (
    (min === undefined || value >= min) &&
    (max === undefined || value <= max) &&
    (above === undefined || value > above) &&
    (below === undefined || value < below) &&
    (!isWhole || Number.isInteger(value))
  );
}

/** Only where both ends are known: else a moved point would always fit somewhere. */
function movedPoint(value: number, limits: Limits): string | undefined {
  const high = limits.max ?? limits.below;
  const low = limits.min ?? limits.above;
  if (high === undefined || low === undefined || limits.isWhole) return undefined;
  for (let tenth = value / 10, step = 0; step < 6; tenth /= 10, step += 1) {
    if (fits(tenth, limits)) return numberOut(tenth);
  }
  return undefined;
}

function limitsText({ label, unit, min, max, above, below, isWhole }: Words & Limits): string {
  const of = unit === undefined ? '' : unit.startsWith('°') ? unit : ` ${unit}`;
  const low = min === undefined ? above : min;
  const high = max === undefined ? below : max;
  const kind = isWhole ? ' is a whole number' : ' lies';
  const minus = (value: number) => String(value).replace('-', '\u2212');
  if (low !== undefined && high !== undefined) {
    return `“${label}”${kind} between ${minus(low)} and ${minus(high)}${of}.`;
  }
  if (above !== undefined) return `“${label}”${isWhole ? `${kind},` : ' is'} more than ${minus(above)}${of}.`;
  if (min !== undefined) return `“${label}”${isWhole ? `${kind},` : ' is'} at least ${minus(min)}${of}.`;
  if (high !== undefined) return `“${label}”${isWhole ? `${kind},` : ' is'} at most ${minus(high)}${of}.`;
  return `“${label}” is a whole number.`;
}

function textOf(
  words: Words & { isNeeded?: boolean; longest: number; kind: 'text' | 'area' },
): Field<string> {
  const { isNeeded = false, longest, ...rest } = words;
  return {
    ...rest,
    read: (text) => {
      const value = text.trim();
      if (isNeeded && value === '') return refuse(`“${words.label}” is empty. Type it.`);
      if (value.length > longest)
        return refuse(`“${words.label}” has ${value.length} letters. It takes at most ${longest}.`);
      return { ok: true, value };
    },
    write: (value) => value,
  };
}
