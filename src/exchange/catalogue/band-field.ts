import { neededField, refuse, type Field } from './field';

/** A band by its frequency, written one way, so that stations, sources and modes name the same band alike. */
export const bandField: Field<string> = neededField(
  { label: 'Band', help: 'By its frequency, as 22 GHz.' },
  (text) => {
    const found = /^(\d{1,4}(?:[.,]\d{1,3})?)\s*([gm])hz$/i.exec(text.trim());
    const [, number = '', letter = ''] = found ?? [];
    const value = Number(number.replace(',', '.'));
    if (!(value > 0))
      return refuse(`“${text.trim().slice(0, 20)}” is no band. Type it as 22 GHz or 8.4 GHz.`);
    return { ok: true, value: `${value} ${letter.toUpperCase()}Hz` };
  },
  (band) => band,
);
