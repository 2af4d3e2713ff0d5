import type { Wrong } from '@/src/exchange/catalogue/block';

/** A verb's answer by field, as the form shows it. */
export const wrongOf = (fields: Readonly<Record<string, readonly string[]>>): Wrong[] =>
  Object.entries(fields).flatMap(([field, messages]) => messages.map((message) => ({ field, message })));

/** "2 fields need another look." */
export const wrongText = (count: number): string =>
  count === 1 ? 'One field needs another look.' : `${count} fields need another look.`;

/** The first field that is wrong gets the focus. */
export function focusWrong(form: HTMLElement | null): void {
  requestAnimationFrame(() => form?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
}
