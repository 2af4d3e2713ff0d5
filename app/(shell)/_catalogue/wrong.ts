import type { Wrong } from '@/src/exchange/catalogue/block';

/** A verb's answer by field, as the form shows it. */
export const wrongOf = (fields: Readonly<Record<string, readonly string[]>>): Wrong[] =>
  Object.entries(fields).flatMap(([field, messages]) => messages.map((message) => ({ field, message })));

/** The first field that is wrong gets the focus. */
export function focusWrong(form: HTMLElement | null): void {
  requestAnimationFrame(() => form?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
}
