/**
 * One measured thing beside what it is measured against, in the same run.
 * @typedef {object} Row
 * @property {string} what
 * @property {number} value
 * @property {string} unit
 * @property {number | null} floor the same measure of the bare thing; null where there is none
 * @property {number | null} ratio value / floor
 * @property {number | null} aim the highest ratio wanted
 * @property {string} [note] how it was measured, or why it misses its aim
 * @property {string} [fault] why the run fails, whatever the aim: a count that does not depend on the machine got worse
 */

/** @param {number | null} value */
function digits(value) {
  if (value === null) return '-';
  return Number.isInteger(value) ? String(value) : value.toPrecision(Math.abs(value) < 100 ? 3 : 4);
}

/** @param {Row} row */
export function misses({ ratio, aim }) {
  return ratio !== null && aim !== null && ratio > aim;
}

/** @param {Row} row */
function cells(row) {
  const verdict = row.aim === null ? '' : misses(row) ? 'missed' : 'met';
  return [
    row.what,
    digits(row.value),
    row.unit,
    digits(row.floor),
    digits(row.ratio),
    digits(row.aim),
    verdict,
    row.note ?? '',
  ];
}

/**
 * @param {Row[]} rows
 * @returns {string} columns in line, numbers to the right
 */
export function table(rows) {
  const all = [['what', 'value', 'unit', 'floor', 'ratio', 'aim', '', 'note'], ...rows.map(cells)];
  const widths = all[0]?.map((_, column) => Math.max(...all.map((line) => (line[column] ?? '').length))) ?? [];
  const numeric = new Set([1, 3, 4, 5]);
  return all
    .map((line) =>
      line.map((cell, column) =>
        numeric.has(column) ? cell.padStart(widths[column] ?? 0) : cell.padEnd(widths[column] ?? 0),
      ),
    )
    .map((line) => line.join('  ').trimEnd())
    .join('\n');
}
