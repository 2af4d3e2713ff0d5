/** Lines of a file: ASCII minus, no thousands mark, and no cell a spreadsheet would run. */
export function csvText(lines: readonly (readonly (string | number)[])[]): string {
  return lines.map((cells) => cells.map(quoted).join(',')).join('\r\n') + '\r\n';
}

function quoted(value: string | number): string {
  const text = String(value);
  const isFormula = /^[=+@\t\r]/.test(text) || (/^-/.test(text) && !Number.isFinite(Number(text)));
  const safe = isFormula ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
