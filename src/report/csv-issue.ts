/** What is wrong in a CSV file: where, what was found, what is allowed. */

export interface CsvIssue {
  /** As a spreadsheet counts: the header is row 1; 0 for the file as a whole. */
  readonly row: number
  /** Header of the column; empty where the row or the file as a whole is meant. */
  readonly column: string
  readonly found: string
  readonly allowed: string
}

/** The issue as one line of text. */
export function sentence({ row, column, found, allowed }: CsvIssue): string {
  const where = [row > 0 ? `row ${row}` : 'the file', ...(column ? [`column ${column}`] : [])]
  return `${where.join(', ')}: found ${found}; allowed: ${allowed}`
}
