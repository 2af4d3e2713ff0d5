'use client';

import { useId } from 'react';
import { Field } from '@/app/_ui/field';
import { Segments } from '@/app/_ui/segments';
import {
  scalarsOf,
  tablesOf,
  type AnyBlock,
  type Typed,
  type TypedRow,
  type Wrong,
} from '@/src/exchange/catalogue/block';
import type { Field as Entry } from '@/src/exchange/catalogue/field';
import { RowsEditor } from './rows-editor';

type Props = {
  block: AnyBlock;
  typed: Typed;
  wrong: readonly Wrong[];
  onType: (name: string, value: string | readonly TypedRow[]) => void;
};

/** Every field of a block, then its tables, then what follows from them. */
export function BlockFields({ block, typed, wrong, onType }: Props) {
  const hidden = block.hides?.(typed) ?? [];
  const labels = block.labels?.(typed) ?? {};
  const fields = scalarsOf(block)
    .filter(([name]) => !hidden.includes(name))
    .map(([name, field]) => [name, { ...field, label: labels[name] ?? field.label }] as const);
  return (
    <>
      {fields.length > 0 && (
        <div className="block-fields">
          {fields.map(([name, field]) => (
            <Scalar
              key={name}
              name={name}
              field={field}
              text={textOf(typed[name])}
              wrong={wrong.find((one) => one.field === name)}
              onType={(text) => onType(name, text)}
            />
          ))}
        </div>
      )}
      {tablesOf(block).map(([name, table]) => (
        <RowsEditor
          key={name}
          name={name}
          table={table}
          rows={rowsOf(typed[name])}
          wrong={wrong}
          onRows={(rows) => onType(name, rows)}
        />
      ))}
    </>
  );
}

type ScalarProps = {
  name: string;
  field: Entry<unknown>;
  text: string;
  wrong: Wrong | undefined;
  onType: (text: string) => void;
};

function Scalar({ name, field, text, wrong, onType }: ScalarProps) {
  const read = field.echo && text.trim() !== '' ? field.read(text) : null;
  const help = read?.ok && field.echo ? field.echo(read.value) : field.help;
  if (field.kind === 'choice') return <Choice {...{ name, field, text, wrong, onType }} />;
  if (field.kind === 'area') return <Area {...{ name, field, text, wrong, onType }} />;
  return (
    <div>
      <Field
        label={field.label}
        name={name}
        className="h-field"
        autoComplete="off"
        spellCheck={false}
        value={text}
        onChange={({ target }) => onType(target.value)}
        help={help}
        error={wrong?.message}
        end={field.unit}
      />
      <Mend wrong={wrong} onType={onType} />
    </div>
  );
}

/** The likely right value, one click away. */
function Mend({ wrong, onType }: Pick<ScalarProps, 'wrong' | 'onType'>) {
  const { mend } = wrong ?? {};
  if (mend === undefined) return null;
  return (
    <button type="button" className="link text-small" onClick={() => onType(mend)}>
      Make it {mend.replace('-', '\u2212')}
    </button>
  );
}

function Choice({ name, field, text, wrong, onType }: ScalarProps) {
  const id = useId();
  const choices = field.choices ?? [];
  const error = wrong && (
    <p id={`${id}-error`} className="mt-1 text-small font-strong text-verm">
      {wrong.message}
    </p>
  );
  if (choices.length <= 3 && choices.some(({ value }) => value === text)) {
    return (
      <div className="block-wide" data-field={name}>
        <span className="label">{field.label}</span>
        <Segments label={field.label} value={text} options={choices} onChoose={onType} />
        {field.help !== undefined && <p className="help mt-1">{field.help}</p>}
        {error}
      </div>
    );
  }
  return (
    <div>
      <label className="label" htmlFor={id}>
        {field.label}
      </label>
      <select
        id={id}
        name={name}
        className="field h-field"
        value={text}
        onChange={({ target }) => onType(target.value)}
        aria-invalid={wrong !== undefined || undefined}
        aria-describedby={wrong && `${id}-error`}
      >
        {!choices.some(({ value }) => value === text) && <option value="">Choose</option>}
        {choices.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </select>
      {error}
    </div>
  );
}

function Area({ name, field, text, wrong, onType }: ScalarProps) {
  const id = useId();
  return (
    <div className="block-wide">
      <label className="label" htmlFor={id}>
        {field.label}
      </label>
      <textarea
        id={id}
        name={name}
        rows={5}
        className="field block-area"
        value={text}
        onChange={({ target }) => onType(target.value)}
        aria-invalid={wrong !== undefined || undefined}
        aria-describedby={`${id}-help${wrong ? ` ${id}-error` : ''}`}
      />
      <p id={`${id}-help`} className="help mt-1">
        {field.help}
      </p>
      {wrong && (
        <p id={`${id}-error`} className="mt-1 text-small font-strong text-verm">
          {wrong.message}
        </p>
      )}
    </div>
  );
}

const textOf = (entry: Typed[string] | undefined) => (typeof entry === 'string' ? entry : '');
const rowsOf = (entry: Typed[string] | undefined) =>
  typeof entry === 'string' || entry === undefined ? [] : entry;
