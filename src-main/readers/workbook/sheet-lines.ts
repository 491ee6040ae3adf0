/**
 * The rows of a sheet as comma-separated lines, all as wide as the sheet, so that everything that reads text tables
 * reads sheets too. Numbers keep all their digits; a date is written as one; empty rows stay, as empty lines.
 */
export function sheetLines(rows: readonly (readonly unknown[])[]): string[] {
  return rows.map((row) => {
    const cells = row.map(cellText);
    return cells.every((cell) => cell === '') ? '' : cells.join(',');
  });
}

function cellText(cell: unknown): string {
  if (cell instanceof Date) return dateText(cell);
  if (typeof cell !== 'string' && typeof cell !== 'number' && typeof cell !== 'boolean') return '';
  const text = String(cell).replaceAll(/\s+/g, ' ').trim();
  return /[",]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

function dateText(date: Date): string {
  if (Number.isNaN(date.getTime())) return '';
  const text = date.toISOString();
  return text.endsWith('T00:00:00.000Z') ? text.slice(0, 10) : text.slice(0, 16);
}
